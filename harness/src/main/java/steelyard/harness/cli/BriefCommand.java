package steelyard.harness.cli;

import java.io.PrintWriter;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.sweep.text.Phrases;
import steelyard.results.brief.Facts;
import steelyard.results.brief.page.JsonPage;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Sweep;
import steelyard.results.ledger.SweepSummary;

/** Makes the brief of a sweep. */
@Command(
    name = "brief",
    description = {
      "Makes the brief of a sweep, also while it runs: a page for the browser, the same facts as"
          + " JSON, and as text here."
    },
    mixinStandardHelpOptions = true,
    footerHeading = "%nExamples:%n",
    footer = {"  steelyard brief", "  steelyard brief nightly", "  steelyard brief --json | jq ."})
final class BriefCommand implements Callable<Integer> {
  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(
      arity = "0..1",
      paramLabel = "SWEEP",
      description = "The sweep's name. Default: the latest sweep.")
  private String name;

  @Option(names = "--json", description = "Print the facts as JSON instead of text.")
  private boolean json;

  @Override
  public Integer call() {
    try (Ledger ledger = Ledger.read(shared.file())) {
      Sweep sweep = find(ledger);
      Briefs briefs = new Briefs(ledger, shared.folder());
      SortedMap<String, Facts> facts = briefs.facts(sweep);
      PrintWriter out = spec.commandLine().getOut();
      if (json) {
        out.println(json(facts));
        briefs.write(sweep, facts);
      } else {
        briefs.report(sweep, facts, out);
      }
      return Briefs.isSound(facts) ? ExitStatus.OK : ExitStatus.FINDING;
    }
  }

  /** One object, or an array of one for each family. */
  private static String json(SortedMap<String, Facts> all) {
    List<String> texts =
        all.values().stream().map(facts -> JsonPage.json(facts).stripTrailing()).toList();
    return texts.size() == 1 ? texts.get(0) : "[" + String.join(",\n", texts) + "]";
  }

  private Sweep find(Ledger ledger) {
    Optional<Sweep> found =
        name == null
            ? ledger.plans().sweeps().stream()
                .reduce((first, second) -> second)
                .flatMap(summary -> ledger.plans().find(summary.id()))
            : ledger.plans().latest(name);
    return found.orElseThrow(
        () ->
            name == null
                ? new HarnessProblem("no sweeps yet in " + shared.folder())
                : new HarnessProblem(
                    Phrases.unknown(
                        "sweep",
                        name,
                        ledger.plans().sweeps().stream().map(SweepSummary::name).toList())));
  }
}
