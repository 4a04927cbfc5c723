package steelyard.harness.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.Optional;
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
import steelyard.results.brief.page.TextPage;
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
      Facts facts = briefs.facts(sweep);
      PrintWriter out = spec.commandLine().getOut();
      out.println((json ? JsonPage.json(facts) : TextPage.text(facts)).stripTrailing());
      Path page = briefs.write(sweep, facts);
      if (!json) {
        out.println("\nThe page: " + page);
      }
      return facts.trust().isSound() ? ExitStatus.OK : ExitStatus.FINDING;
    }
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
