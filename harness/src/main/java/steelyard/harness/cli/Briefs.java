package steelyard.harness.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
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

  /** The facts of a sweep as far as it has come. */
  Facts facts(Sweep sweep) {
    List<Observation> observations = ledger.observations(sweep.id());
    return Brief.of(context(sweep, observations.size()), observations);
  }

  private BriefContext context(Sweep sweep, int finished) {
    SweepSummary summary =
        ledger.plans().sweeps().stream()
            .filter(each -> each.id().equals(sweep.id()))
            .findFirst()
            .orElseThrow();
    BriefChoices choices = choices(sweep);
    Rules rules =
        new Rules(
            choices.tieMargin(),
            choices.penalty(),
            Rules.STANDARD.shiftSeconds(),
            Rules.STANDARD.floorSeconds());
    return new BriefContext(
        new BriefContext.Plan(
            sweep.name(),
            sweep.inService().orElse("none"),
            Math.toIntExact(summary.cells()),
            finished,
            sweep.planned(),
            summary.lastRun(),
            sweep.file()),
        site(sweep),
        rules,
        choices.pairs().stream()
            .map(pair -> new BriefContext.Asked(pair.before(), pair.after()))
            .toList(),
        List.of(),
        "steelyard rerun " + BriefContext.RUN);
  }

  private BriefChoices choices(Sweep sweep) {
    Path file = choicesFile(folder, sweep.id());
    try {
      return BriefChoices.ofJson(Files.readString(file), file.toString());
    } catch (IOException e) {
      return new BriefChoices(List.of(), Rules.STANDARD.margin(), Rules.STANDARD.penaltyFactor());
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

  /** Writes page and JSON into the ledger's folder; where the page lies. */
  Path write(Sweep sweep, Facts facts) {
    Path into = folder.resolve("briefs").resolve(sweep.name());
    try {
      Files.createDirectories(into);
      Path page = into.resolve("brief.html");
      HtmlPage.write(facts, page);
      JsonPage.write(facts, into.resolve("brief.json"));
      return page;
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write the brief to " + into, e);
    }
  }
}
