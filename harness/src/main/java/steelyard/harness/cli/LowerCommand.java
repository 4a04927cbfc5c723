package steelyard.harness.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.Folders;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.local.RunMaker;
import steelyard.harness.local.RunPlan;
import steelyard.harness.process.MachineFacts;
import steelyard.harness.worker.Event;
import steelyard.results.ledger.Goal;

/** Shows what a backend gets. */
@Command(
    name = "lower",
    description = "Shows what a backend gets: sizes in total and by group, and the model itself.",
    mixinStandardHelpOptions = true,
    sortOptions = false,
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard lower workshop ft06 --backend sat",
      "  steelyard lower workshop ft06 --backend sat --format dimacs --out ft06.cnf"
    })
final class LowerCommand implements Callable<Integer> {
  @Mixin private Shared shared;
  @Mixin private CandidateOptions candidate;
  @Spec private CommandSpec spec;

  @Option(
      names = "--format",
      paramLabel = "NAME",
      defaultValue = "",
      description = "Also write the model in this open format, such as dimacs.")
  private String format;

  @Option(names = "--out", paramLabel = "FILE", description = "Where to write it.")
  private Path file;

  @Override
  public Integer call() throws IOException {
    if (format.isEmpty() != (file == null)) {
      throw new HarnessProblem("--format and --out go together");
    }
    PrintWriter out = spec.commandLine().getOut();
    try (Desk desk = Desk.open(shared.jars())) {
      RunPlan plan = candidate.plan(desk.catalogue(), desk.builds(), Goal.optimise());
      Path folder = Files.createTempDirectory("steelyard-lower");
      try {
        RunMaker maker = new RunMaker(desk.crew(), desk.session(MachineFacts.here()), desk.clock());
        String target = file == null ? "" : file.toAbsolutePath().toString();
        WorkerEnd end = maker.lower(plan, folder, format, target);
        end.orThrow("lowering");
        print(end, out);
      } finally {
        Folders.delete(folder);
      }
    }
    return ExitStatus.OK;
  }

  private static void print(WorkerEnd end, PrintWriter out) {
    Event.Lowered lowered = end.last(Event.Lowered.class).orElseThrow();
    lowered
        .totals()
        .forEach(
            (name, amount) -> out.println(String.format(Locale.ROOT, "%,12d  %s", amount, name)));
    out.println();
    long all = Math.max(1, lowered.totals().get(lowered.unit()));
    out.println(lowered.unit() + " by group");
    List<Map.Entry<String, Long>> groups =
        lowered.byGroup().entrySet().stream()
            .sorted(Map.Entry.<String, Long>comparingByValue().reversed())
            .toList();
    for (Map.Entry<String, Long> group : groups) {
      out.println(
          String.format(
              Locale.ROOT,
              "%,12d  %3.0f %%  %s",
              group.getValue(),
              100.0 * group.getValue() / all,
              Columns.visible(group.getKey())));
    }
    out.println();
    lowered.how().forEach((kind, how) -> out.println("  " + kind + ": " + how));
  }
}
