package steelyard.harness.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.sweep.BriefChoices;
import steelyard.results.brief.Brief;
import steelyard.results.brief.BriefContext;
import steelyard.results.brief.Facts;
import steelyard.results.brief.Rules;
import steelyard.results.brief.page.HtmlPage;
import steelyard.results.brief.page.JsonPage;
import steelyard.results.brief.page.TextPage;
import steelyard.results.ledger.Block;
import steelyard.results.ledger.Calibration;
import steelyard.results.ledger.Cell;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Session;
import steelyard.results.ledger.Sweep;
import steelyard.results.ledger.SweepSummary;

/** Makes the brief of a sweep from the ledger. */
final class Briefs {
  private final Ledger ledger;
  private final Path folder;

  /**
   * Of the sweeps in one ledger.
   *
   * @param folder the ledger's folder
   */
  Briefs(Ledger ledger, Path folder) {
    this.ledger = ledger;
    this.folder = folder;
  }

  /** Keeps what the sweep file says of the report. */
  static void keep(BriefChoices choices, String sweep, Path folder) {
    Path file = choicesFile(folder, sweep);
    try {
      Files.createDirectories(file.getParent());
      Path beside = file.resolveSibling(file.getFileName() + ".part");
      Files.write(beside, choices.toJson().getBytes(StandardCharsets.UTF_8));
      Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write " + file, e);
    }
  }

  private static Path choicesFile(Path folder, String sweep) {
    return folder.resolve("sweeps").resolve(sweep + ".json");
  }

  /** The facts of a sweep as far as it has come, by family. */
  SortedMap<String, Facts> facts(Sweep sweep) {
    Map<String, Integer> planned = plannedRuns(sweep);
    BriefChoices choices = choices(sweep, planned.keySet());
    List<Observation> observations = ledger.observations(sweep.id());
    SortedMap<String, Facts> all = new TreeMap<>();
    choices
        .families()
        .forEach(
            (family, contested) -> {
              List<Observation> own =
                  observations.stream().filter(run -> run.family().equals(family)).toList();
              String name =
                  choices.families().size() == 1 ? sweep.name() : sweep.name() + ": " + family;
              BriefContext.Plan plan =
                  new BriefContext.Plan(
                      name,
                      contested.inService(),
                      planned.getOrDefault(family, 0),
                      own.size(),
                      sweep.planned(),
                      lastRun(sweep),
                      sweep.file());
              all.put(family, Brief.of(context(sweep, plan, choices, contested), own));
            });
    return all;
  }

  private SortedMap<String, Integer> plannedRuns(Sweep sweep) {
    SortedMap<String, Integer> planned = new TreeMap<>();
    for (Block block : ledger.plans().blocks(sweep.id())) {
      block.cells().forEach(cell -> planned.merge(cell.recipe().family(), 1, Integer::sum));
    }
    return planned;
  }

  private Optional<Instant> lastRun(Sweep sweep) {
    return ledger.plans().sweeps().stream()
        .filter(each -> each.id().equals(sweep.id()))
        .findFirst()
        .flatMap(SweepSummary::lastRun);
  }

  private BriefContext context(
      Sweep sweep, BriefContext.Plan plan, BriefChoices choices, BriefChoices.Contested contested) {
    Rules rules =
        new Rules(
            choices.tieMargin(),
            choices.penalty(),
            Rules.STANDARD.shiftSeconds(),
            Rules.STANDARD.floorSeconds());
    return new BriefContext(
        plan,
        site(sweep),
        rules,
        contested.pairs().stream()
            .map(pair -> new BriefContext.Asked(pair.before(), pair.after()))
            .toList(),
        List.of(),
        "steelyard rerun " + BriefContext.RUN);
  }

  /** As the sweep file said; where that is lost, the standard. */
  private BriefChoices choices(Sweep sweep, Set<String> families) {
    Path file = choicesFile(folder, sweep.id());
    try {
      return BriefChoices.ofJson(Files.readString(file), file.toString());
    } catch (IOException e) {
      SortedMap<String, BriefChoices.Contested> standard = new TreeMap<>();
      String inService = sweep.inService().orElse("none");
      families.forEach(f -> standard.put(f, new BriefChoices.Contested(inService, List.of())));
      return new BriefChoices(standard, Rules.STANDARD.margin(), Rules.STANDARD.penaltyFactor());
    }
  }

  private BriefContext.Site site(Sweep sweep) {
    SortedMap<String, String> versions = new TreeMap<>();
    for (Block block : ledger.plans().blocks(sweep.id())) {
      for (Cell cell : block.cells()) {
        versions.put(
            cell.backend().name(), cell.backend().adapter() + " " + cell.backend().version());
      }
    }
    List<Session> sessions = ledger.sessions().of(sweep.id());
    List<BriefContext.Version> shown = new ArrayList<>();
    versions.forEach((name, version) -> shown.add(new BriefContext.Version(name, version)));
    sessions.stream()
        .map(session -> session.machine().getOrDefault("jdk", ""))
        .filter(jdk -> !jdk.isEmpty())
        .distinct()
        .forEach(jdk -> shown.add(new BriefContext.Version("JDK", jdk)));
    String machine =
        String.join("; ", sessions.stream().map(Session::machineClass).distinct().toList());
    return new BriefContext.Site(machine, calibration(sessions), shown);
  }

  private String calibration(List<Session> sessions) {
    List<Long> nanos =
        sessions.stream()
            .flatMap(session -> ledger.sessions().calibrations(session.id()).stream())
            .map(Calibration::nanos)
            .sorted()
            .toList();
    if (nanos.isEmpty()) {
      return "not measured";
    }
    double least = nanos.get(0) / 1e6;
    double most = nanos.get(nanos.size() - 1) / 1e6;
    return String.format(
        Locale.ROOT,
        "fixed task %.0f ms, %.0f ms at most, over %d measurements",
        least,
        most,
        nanos.size());
  }

  /**
   * Writes pages and JSON into the ledger's folder.
   *
   * @param all by family
   * @return where the pages lie
   */
  List<Path> write(Sweep sweep, SortedMap<String, Facts> all) {
    Path into = folder.resolve("briefs").resolve(sweep.name());
    try {
      Files.createDirectories(into);
      List<Path> pages = new ArrayList<>();
      for (Map.Entry<String, Facts> facts : all.entrySet()) {
        String name = all.size() == 1 ? "brief" : "brief-" + facts.getKey();
        Path page = into.resolve(name + ".html");
        HtmlPage.write(facts.getValue(), page);
        JsonPage.write(facts.getValue(), into.resolve(name + ".json"));
        pages.add(page);
      }
      return pages;
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write the brief to " + into, e);
    }
  }

  /** Prints the facts, then writes the pages and says where they lie. */
  void report(Sweep sweep, SortedMap<String, Facts> all, PrintWriter out) {
    all.values().forEach(facts -> out.println(TextPage.text(facts).stripTrailing() + "\n"));
    List<Path> pages = write(sweep, all);
    out.println(pages.size() == 1 ? "The page: " + pages.get(0) : "The pages:");
    if (pages.size() > 1) {
      pages.forEach(page -> out.println("  " + page));
    }
  }

  /** Whether no answer of any family is wrong. */
  static boolean isSound(SortedMap<String, Facts> all) {
    return all.values().stream().allMatch(facts -> facts.trust().isSound());
  }
}
