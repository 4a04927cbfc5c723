package steelyard.harness.cli;

import java.io.PrintWriter;
import java.util.List;
import java.util.Locale;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.RunRecord;
import steelyard.results.ledger.RunRecords;
import steelyard.results.ledger.Standing;
import steelyard.results.ledger.Times;
import steelyard.results.ledger.Trace;
import steelyard.results.ledger.Verdict;

/** Shows everything of one run. */
@Command(
    name = "show",
    description = "Shows one run: what was run, how it went, what was found, how it was judged.",
    mixinStandardHelpOptions = true,
    footerHeading = "%nExamples:%n",
    footer = {"  steelyard show 3fa2", "  steelyard show 3fa2 --json"})
final class ShowCommand implements Callable<Integer> {
  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(paramLabel = "RUN", description = "A unique beginning of the run's id.")
  private String run;

  @Option(names = "--json", description = "Print the whole record as JSON.")
  private boolean json;

  @Override
  public Integer call() {
    PrintWriter out = spec.commandLine().getOut();
    try (Ledger ledger = Ledger.read(shared.file())) {
      RunRecord record = ledger.runs().record(run);
      if (json) {
        out.println(RunRecords.export(record));
        return ExitStatus.OK;
      }
      Standing standing = ledger.judging().standing(record.run());
      print(record, out);
      List<Verdict> verdicts = ledger.judging().verdicts(record.run());
      out.println("check      " + (verdicts.isEmpty() ? "UNCHECKED" : last(verdicts).check()));
      verdicts.stream()
          .map(Verdict::detail)
          .filter(detail -> !detail.isBlank())
          .forEach(detail -> Columns.wrapped(out, "           ", Columns.visible(detail)));
      out.println(
          "claim      "
              + standing.claim()
              + (standing.agreeing() > 0 ? " by " + standing.agreeing() : ""));
    }
    return ExitStatus.OK;
  }

  private static Verdict last(List<Verdict> verdicts) {
    return verdicts.get(verdicts.size() - 1);
  }

  private static void print(RunRecord record, PrintWriter out) {
    out.println("run        " + record.run());
    out.println("candidate  " + record.recipe().variant() + " on " + record.backend().name());
    out.println(
        Columns.visible(
            "instance   " + record.recipe().family() + " " + record.recipe().instance().name()));
    out.println("seed       " + record.conditions().seed());
    out.println("version    " + record.backend().adapter() + " " + record.backend().version());
    record
        .setting()
        .options()
        .forEach((name, value) -> out.println("           " + name + " = " + value));
    out.println("finished   " + record.finished());
    out.println("outcome    " + record.outcome().status() + ", " + record.outcome().ending());
    record
        .outcome()
        .reason()
        .ifPresent(r -> Columns.wrapped(out, "           ", Columns.visible(r)));
    record.outcome().objective().ifPresent(value -> out.println("objective  " + value));
    record.outcome().bound().ifPresent(value -> out.println("bound      " + value));
    for (Times.Phase phase : Times.Phase.values()) {
      if (record.times().phases().containsKey(phase)) {
        out.println(
            String.format(
                Locale.ROOT,
                "%-9s  %.3f s",
                phase.name().toLowerCase(Locale.ROOT),
                record.times().wallNanos(phase) / 1e9));
      }
    }
    out.println(
        String.format(
            Locale.ROOT,
            "memory     %.0f MB at most (%s)",
            record.memory().bytes() / 1e6,
            record.memory().source()));
    record.counters().forEach((name, value) -> out.println("count      " + name + " " + value));
    out.println("solutions  " + record.trace().solutionCount());
    for (Trace.Solution solution : record.trace().solutions()) {
      solution
          .objective()
          .ifPresent(
              value ->
                  out.println(
                      String.format(
                          Locale.ROOT, "           %.3f s  %d", solution.nanos() / 1e9, value)));
    }
    if (!record.exit().stderrTail().isBlank()) {
      out.println("stderr");
      out.println(Columns.visible(record.exit().stderrTail()).stripTrailing());
    }
  }
}
