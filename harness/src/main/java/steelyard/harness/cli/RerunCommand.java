package steelyard.harness.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.Folders;
import steelyard.harness.local.RunIds;
import steelyard.harness.local.RunMaker;
import steelyard.harness.local.RunPlan;
import steelyard.harness.process.MachineFacts;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.Setup;
import steelyard.harness.sweep.SingleChoice;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.ModelFacts;
import steelyard.results.ledger.RunRecord;

/** Repeats a run and says whether it went the same way. */
@Command(
    name = "rerun",
    description = {
      "Repeats a run in the foreground, with the same candidate, seed and limits, and says whether"
          + " model, answer and counters are the same."
    },
    mixinStandardHelpOptions = true,
    exitCodeListHeading = "%nExit status:%n",
    exitCodeList = {"0:the same", "2:a mistake in what was given", "4:different"},
    footerHeading = "%nExamples:%n",
    footer = {"  steelyard rerun 3fa2"})
final class RerunCommand implements Callable<Integer> {
  private static final Duration BUILD = Duration.ofMinutes(1);

  @Mixin private Shared shared;
  @Spec private CommandSpec spec;

  @Parameters(paramLabel = "RUN", description = "A unique beginning of the run's id.")
  private String run;

  @Override
  public Integer call() throws IOException {
    PrintWriter out = spec.commandLine().getOut();
    RunRecord before;
    try (Ledger ledger = Ledger.read(shared.file())) {
      before = ledger.runs().record(run);
    }
    try (Desk desk = Desk.open(shared.jars())) {
      RunPlan plan = plan(before, desk.catalogue());
      Path folder = Files.createTempDirectory("steelyard-rerun");
      try {
        RunRecord after =
            new RunMaker(desk.crew(), desk.session(MachineFacts.here()), desk.clock())
                .make(plan, folder.resolve(plan.run()), List.of(), event -> {});
        List<String> differences = differences(before, after);
        out.println("before  " + Summaries.outcome(before, Check.UNCHECKED));
        out.println("after   " + Summaries.outcome(after, Check.UNCHECKED));
        differences.forEach(out::println);
        out.println(differences.isEmpty() ? "the same" : "different");
        return desk.signalStatus()
            .orElse(differences.isEmpty() ? ExitStatus.OK : ExitStatus.DIFFERENT);
      } finally {
        Folders.delete(folder);
      }
    }
  }

  private static RunPlan plan(RunRecord before, Catalogue catalogue) {
    Catalogue.Backend backend = SingleChoice.backend(catalogue, before.backend().adapter());
    SingleChoice.variant(catalogue, before.recipe().family(), before.recipe().variant());
    return new RunPlan(
        RunIds.next(),
        before.key(),
        before.attempt() + 1,
        Optional.empty(),
        before.recipe(),
        new Setup(
            before.backend(),
            before.setting(),
            before.conditions().threads(),
            before.conditions().limits()),
        before.conditions().goal(),
        before.conditions().seed(),
        before.model().map(ModelFacts::plainCanonical),
        BUILD,
        backend.heapShare());
  }

  private static List<String> differences(RunRecord before, RunRecord after) {
    List<String> differences = new ArrayList<>();
    compare(
        "model",
        before.model().map(m -> m.asBuilt().hex().substring(0, 12)).orElse("none"),
        after.model().map(m -> m.asBuilt().hex().substring(0, 12)).orElse("none"),
        differences);
    compare("status", before.outcome().status(), after.outcome().status(), differences);
    compare("objective", before.outcome().objective(), after.outcome().objective(), differences);
    TreeSet<String> names = new TreeSet<>(before.counters().keySet());
    names.addAll(after.counters().keySet());
    for (String name : names) {
      compare(
          name,
          before.counters().getOrDefault(name, 0L),
          after.counters().getOrDefault(name, 0L),
          differences);
    }
    return differences;
  }

  private static void compare(String what, Object before, Object after, List<String> differences) {
    if (!before.equals(after)) {
      differences.add("  " + what + ": " + before + " before, " + after + " after");
    }
  }
}
