package steelyard.variants.catalog.kilns;

import java.io.IOException;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Ints;

/** Reads a campaign from lines such as {@code lot L07 shelves 3 format large heats 1-2 ...}. */
final class CampaignReader {
  static final String TITLE = "kiln-campaign";
  static final String LARGE = "large";
  static final String SMALL = "small";

  private static final List<String> KEYWORDS =
      List.of(
          "works",
          "heat",
          "change",
          "glaze",
          "spoils",
          "kiln",
          "repair",
          "lot",
          "together",
          "second");
  private static final List<String> NEEDED =
      List.of("works", "heat", "change", "glaze", "kiln", "lot");
  private static final List<Glaze.Kind> KINDS = List.of(Glaze.Kind.values());
  private static final Pattern SPAN = Pattern.compile("([0-9]{1,3})-([0-9]{1,3})");
  private static final int MOST_DAYS = 1000;
  private static final int MOST_HEATS = 20;
  private static final int MOST = 100_000;

  private final List<Entry> entries;

  private CampaignReader(List<Entry> entries) {
    this.entries = entries;
  }

  /**
   * The campaign in {@code source}.
   *
   * @throws InstanceException if there is none; names the line and says what to do
   */
  static Campaign read(InstanceSource source) throws IOException {
    List<String> lines = source.lines();
    List<Entry> entries = Entry.all(source, TITLE, lines);
    for (Entry entry : entries) {
      if (!KEYWORDS.contains(entry.keyword())) {
        throw entry.problem("no such keyword; a line begins with one of " + KEYWORDS);
      }
    }
    CampaignReader reader = new CampaignReader(entries);
    for (String needed : NEEDED) {
      if (reader.of(needed).isEmpty()) {
        throw InstanceException.at(
            source, lines.size(), "the file has no line '" + needed + " ...'; add it");
      }
    }
    return reader.campaign();
  }

  private Campaign campaign() {
    Works works = works(Entry.only("works", entries).orElseThrow());
    List<Heat> heats = numbered("heat", CampaignReader::heat);
    List<Glaze> glazes = named("glaze", CampaignReader::glaze);
    List<String> glazeNames = glazes.stream().map(Glaze::name).toList();
    List<Lot> lots = named("lot", entry -> lot(entry, works, heats.size(), glazeNames));
    List<String> lotNames = lots.stream().map(Lot::name).toList();
    Campaign campaign =
        new Campaign(
            works,
            heats,
            changes(heats.size()),
            glazes,
            of("spoils").stream().map(entry -> pair(entry, "glaze", glazeNames)).toList(),
            kilns(works, heats.size()),
            lots,
            of("together").stream().map(entry -> pair(entry, "lot", lotNames)).toList(),
            of("second").stream().map(entry -> second(entry, works, lotNames)).toList());
    requireKilns(campaign);
    return campaign;
  }

  private void requireKilns(Campaign campaign) {
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      Lot it = campaign.lot(lot);
      if (campaign.kilns().stream().noneMatch(kiln -> campaign.takes(kiln, it))) {
        throw of("lot").get(lot).problem("no kiln is hot enough and has the shelves for it");
      }
    }
  }

  private List<Entry> of(String keyword) {
    return entries.stream().filter(entry -> entry.keyword().equals(keyword)).toList();
  }

  private <T> List<T> numbered(String keyword, Function<Entry, T> read) {
    List<T> list = new ArrayList<>();
    for (Entry entry : of(keyword)) {
      entry.requireNumber(list.size() + 1);
      list.add(read.apply(entry));
    }
    return list;
  }

  private <T> List<T> named(String keyword, Function<Entry, T> read) {
    List<T> list = new ArrayList<>();
    Set<String> names = new HashSet<>();
    for (Entry entry : of(keyword)) {
      if (!names.add(entry.checkedName())) {
        throw entry.problem("there is one of that name already; give it another");
      }
      list.add(read.apply(entry));
    }
    return list;
  }

  private static Works works(Entry entry) {
    entry.requireFields(List.of("days", "crew", "gas", "step"));
    return new Works(
        entry.numberAsName(0, MOST),
        entry.number("days", 1, MOST_DAYS),
        entry.number("crew", 1, MOST),
        entry.number("gas", 0, MOST),
        entry.number("step", 1, MOST_HEATS));
  }

  private static Heat heat(Entry entry) {
    entry.requireFields(List.of("fire", "cool", "gas"));
    return new Heat(
        entry.number("fire", 1, MOST_DAYS),
        entry.number("cool", 0, MOST_DAYS),
        entry.number("gas", 0, MOST));
  }

  private List<Ints> changes(int heats) {
    List<Ints> rows =
        numbered("change", e -> e.requireFields(List.of("to")).numbers("to", heats, 0, MOST));
    if (rows.size() != heats) {
      Entry last = of("change").get(rows.size() - 1);
      throw last.problem("there are " + heats + " heats; give each one line of what changes cost");
    }
    return rows;
  }

  private static Glaze glaze(Entry entry) {
    String word = entry.requireFields(List.of("kind")).word("kind");
    List<String> words = KINDS.stream().map(Glaze.Kind::word).toList();
    return new Glaze(entry.name(), KINDS.get(entry.index("kind", word, words)));
  }

  private List<Kiln> kilns(Works works, int heats) {
    List<Kiln> kilns = named("kiln", entry -> kiln(entry, works, heats));
    List<String> names = kilns.stream().map(Kiln::name).toList();
    of("repair").forEach(repair -> repair.index("kiln", repair.name(), names));
    return kilns;
  }

  private Kiln kiln(Entry entry, Works works, int heats) {
    entry.requireFields(
        List.of("shelves", "wide", "hottest", "set", "mass", "firings", "hot", "fuel"));
    int shelves = entry.number("shelves", 1, MOST);
    int hottest = entry.number("hottest", 1, heats);
    return new Kiln(
        entry.name(),
        shelves,
        entry.number("wide", 0, shelves),
        hottest,
        entry.number("set", 1, hottest),
        entry.number("mass", 0, 100),
        entry.number("firings", 1, MOST_DAYS),
        entry.number("hot", 0, MOST_DAYS),
        entry.numbers("fuel", hottest, 0, MOST),
        repairs(entry.name(), works));
  }

  private List<Kiln.Repair> repairs(String kiln, Works works) {
    List<Kiln.Repair> repairs = new ArrayList<>();
    int free = 0;
    for (Entry entry : of("repair").stream().filter(e -> e.name().equals(kiln)).toList()) {
      entry.requireFields(List.of("from", "until"));
      int from = entry.number("from", free, works.days() - 1);
      free = entry.number("until", from + 1, works.days());
      repairs.add(new Kiln.Repair(from, free));
    }
    return repairs;
  }

  private static Lot lot(Entry entry, Works works, int heats, List<String> glazes) {
    entry.requireFields(
        List.of("shelves", "format", "heats", "glaze", "dry", "due", "rate"), "latest");
    Matcher span = SPAN.matcher(entry.word("heats"));
    if (!span.matches()) {
      throw entry.problem("heats '" + entry.word("heats") + "' must be a span such as 1-2");
    }
    int coolest = entry.number("heats", span.group(1), 1, heats);
    return new Lot(
        entry.name(),
        entry.number("shelves", 1, MOST),
        entry.index("format", entry.word("format"), List.of(SMALL, LARGE)) == 1,
        coolest,
        entry.number("heats", span.group(2), coolest, heats),
        entry.index("glaze", entry.word("glaze"), glazes),
        entry.number("dry", 0, works.days()),
        entry.number("due", 0, MOST_DAYS),
        entry.number("rate", 0, MOST),
        entry.optionalNumber("latest", 0, works.days()));
  }

  private static Pair pair(Entry entry, String what, List<String> names) {
    entry.requireFields(List.of("with"));
    int one = entry.index(what, entry.name(), names);
    int other = entry.index(what, entry.word("with"), names);
    return new Pair(one, other(entry, one, other));
  }

  private static SecondFire second(Entry entry, Works works, List<String> lots) {
    entry.requireFields(List.of("after", "days"));
    int second = entry.index("lot", entry.name(), lots);
    int first = other(entry, second, entry.index("lot", entry.word("after"), lots));
    return new SecondFire(first, second, entry.number("days", 0, works.days()));
  }

  private static int other(Entry entry, int one, int other) {
    if (one == other) {
      throw entry.problem("these must be two; name another");
    }
    return other;
  }
}
