package steelyard.variants.catalog.kilns;

import java.io.IOException;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalLong;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;
import steelyard.variants.model.Ints;

/**
 * A firing plan as the kiln hall books it: a line for each firing that was lit, with the works' own
 * number of the day, and one for what all of it cost.
 *
 * <pre>{@code
 * kiln-plan 1
 * firing A.1 heat 2 day 212 lots L01,L04
 * cost 143
 * }</pre>
 */
final class BookedPlan {
  private static final String TITLE = "kiln-plan";
  private static final String FIRING = "firing";
  private static final String COST = "cost";
  private static final int MOST = 1_000_000;
  private static final int NONE = -1;

  private final Campaign campaign;
  private final List<String> lotNames;
  private final List<String> firingNames;
  private final int[] firingOf;
  private final int[] heats;
  private final int[] starts;

  private BookedPlan(Campaign campaign) {
    this.campaign = campaign;
    this.lotNames = campaign.lots().stream().map(Lot::name).toList();
    this.firingNames = campaign.firings().stream().map(Firing::name).toList();
    this.firingOf = new int[lotNames.size()];
    this.heats = new int[firingNames.size()];
    this.starts = new int[firingNames.size()];
    Arrays.fill(firingOf, NONE);
  }

  /**
   * The plan in {@code file}.
   *
   * @throws InstanceException if there is none of that campaign; names the line and says what to do
   */
  static KnownSolution read(Campaign campaign, InstanceSource file) throws IOException {
    List<String> lines = file.lines();
    List<Entry> entries = Entry.all(file, TITLE, lines);
    BookedPlan booked = new BookedPlan(campaign);
    for (Entry entry : entries) {
      if (entry.keyword().equals(FIRING)) {
        booked.firing(entry);
      } else if (!entry.keyword().equals(COST)) {
        throw entry.problem("no such keyword; a line begins with 'firing' or 'cost'");
      }
    }
    OptionalLong cost =
        Entry.only(COST, entries).stream()
            .mapToLong(entry -> entry.requireFields(List.of()).numberAsName(0, MOST))
            .findFirst();
    for (int lot = 0; lot < booked.firingOf.length; lot++) {
      if (booked.firingOf[lot] == NONE) {
        String name = booked.lotNames.get(lot);
        throw InstanceException.at(
            file, lines.size(), "lot " + name + " is in no firing; add it to one");
      }
    }
    Plan plan = new Plan(Ints.of(booked.firingOf), Ints.of(booked.heats), Ints.of(booked.starts));
    return new KnownSolution(plan.decisions(campaign), cost);
  }

  private void firing(Entry entry) {
    entry.requireFields(List.of("heat", "day", "lots"));
    int index = entry.index(FIRING, entry.name(), firingNames);
    Kiln kiln = campaign.kiln(campaign.firings().get(index));
    if (heats[index] > 0) {
      throw entry.problem("this firing is booked twice; remove one of them");
    }
    int first = campaign.works().day();
    heats[index] = entry.number("heat", 1, kiln.hottest());
    starts[index] = entry.number("day", first, first + campaign.works().days()) - first;
    for (String name : entry.list("lots")) {
      int lot = entry.index("lot", name, lotNames);
      if (firingOf[lot] != NONE) {
        throw entry.problem("lot " + name + " is in a firing already; remove it from one of them");
      }
      if (!campaign.takes(kiln, campaign.lot(lot))) {
        throw entry.problem("the kiln is not hot enough for lot " + name + ", or too small");
      }
      firingOf[lot] = index;
    }
  }

  /** The text that a plan is read from. */
  static String text(Campaign campaign, Plan plan, long cost) {
    List<String> lines = new ArrayList<>(List.of(TITLE + " 1"));
    for (Firing firing : campaign.firings()) {
      if (plan.isLit(firing)) {
        lines.add(
            FIRING
                + " "
                + firing.name()
                + " heat "
                + plan.heat(firing)
                + " day "
                + (campaign.works().day() + plan.start(firing))
                + " lots "
                + names(plan.lotsIn(firing), campaign));
      }
    }
    lines.add(COST + " " + cost);
    return String.join("\n", lines) + "\n";
  }

  private static String names(IntStream lots, Campaign campaign) {
    return lots.mapToObj(lot -> campaign.lot(lot).name()).collect(Collectors.joining(","));
  }
}
