package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.stream.Collectors;
import steelyard.variants.model.Ints;

/** A campaign as the text that it is read from. */
final class CampaignText {
  private final Campaign campaign;
  private final StringBuilder text = new StringBuilder();

  private CampaignText(Campaign campaign) {
    this.campaign = campaign;
  }

  /** The text, with {@code comment} in its second line. */
  static String of(Campaign campaign, String comment) {
    CampaignText it = new CampaignText(campaign);
    it.line(CampaignReader.TITLE + " 1");
    it.line("# " + comment);
    it.works();
    it.kilns();
    it.lots();
    return it.text.toString();
  }

  private void works() {
    Works works = campaign.works();
    line(
        "works "
            + works.day()
            + field("days", works.days())
            + field("crew", works.crew())
            + field("gas", works.gas())
            + field("step", works.step()));
    for (int heat = 1; heat <= campaign.heats().size(); heat++) {
      Heat it = campaign.heat(heat);
      line(
          "heat "
              + heat
              + field("fire", it.fire())
              + field("cool", it.cool())
              + field("gas", it.gas()));
    }
    for (int from = 1; from <= campaign.heats().size(); from++) {
      line("change " + from + field("to", campaign.changes().get(from - 1)));
    }
    for (Glaze glaze : campaign.glazes()) {
      line("glaze " + glaze.name() + field("kind", glaze.kind().word()));
    }
    for (Pair pair : campaign.spoilers()) {
      line("spoils " + glaze(pair.one()) + field("with", glaze(pair.other())));
    }
  }

  private void kilns() {
    for (Kiln kiln : campaign.kilns()) {
      line(
          "kiln "
              + kiln.name()
              + field("shelves", kiln.shelves())
              + field("wide", kiln.wide())
              + field("hottest", kiln.hottest())
              + field("set", kiln.set())
              + field("mass", kiln.mass())
              + field("firings", kiln.firings())
              + field("hot", kiln.hot())
              + field("fuel", kiln.fuel()));
      for (Kiln.Repair repair : kiln.repairs()) {
        line(
            "repair "
                + kiln.name()
                + field("from", repair.from())
                + field("until", repair.until()));
      }
    }
  }

  private void lots() {
    for (Lot lot : campaign.lots()) {
      line(
          "lot "
              + lot.name()
              + field("shelves", lot.shelves())
              + field("format", lot.large() ? CampaignReader.LARGE : CampaignReader.SMALL)
              + field("heats", lot.coolest() + "-" + lot.hottest())
              + field("glaze", glaze(lot.glaze()))
              + field("dry", lot.dry())
              + field("due", lot.due())
              + field("rate", lot.rate())
              + (lot.latest().isPresent() ? field("latest", lot.latest().getAsInt()) : ""));
    }
    List<Lot> lots = campaign.lots();
    for (Pair pair : campaign.together()) {
      line(
          "together " + lots.get(pair.one()).name() + field("with", lots.get(pair.other()).name()));
    }
    for (SecondFire pair : campaign.seconds()) {
      line(
          "second "
              + lots.get(pair.second()).name()
              + field("after", lots.get(pair.first()).name())
              + field("days", pair.days()));
    }
  }

  private String glaze(int index) {
    return campaign.glazes().get(index).name();
  }

  private static String field(String name, Object value) {
    return " " + name + " " + value;
  }

  private static String field(String name, Ints values) {
    return field(
        name, values.stream().mapToObj(Integer::toString).collect(Collectors.joining(",")));
  }

  private void line(String line) {
    text.append(line).append('\n');
  }
}
