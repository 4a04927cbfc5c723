package steelyard.harness.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.concurrent.Callable;
import java.util.function.Consumer;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import steelyard.harness.launch.Folders;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.launch.Judges;
import steelyard.harness.local.JudgeService;
import steelyard.harness.local.RunMaker;
import steelyard.harness.local.RunPlan;
import steelyard.harness.process.MachineFacts;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.StampedEvent;
import steelyard.harness.worker.Verdict;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.RunRecord;

/** Runs one candidate in the foreground. */
@Command(
    name = "solve",
    description = {
      "Runs one candidate on one instance in the foreground: improving solutions as they come, then"
          + " the answer, judged, in the family's own terms. Such a run enters no comparison."
    },
    mixinStandardHelpOptions = true,
    sortOptions = false,
    footerHeading = "%nExamples:%n",
    footer = {
      "  steelyard solve workshop ft06",
      "  steelyard solve workshop ft10 --variant plain+no-overlap --backend engine \\",
      "      --seed 3 --wall 30s --json",
      "  steelyard solve workshop my-moulds.txt --backend sat --work '20000 conflicts'"
    })
final class SolveCommand implements Callable<Integer> {
  private static final Duration JUDGING = Duration.ofMinutes(2);

  @Mixin private Shared shared;
  @Mixin private CandidateOptions candidate;
  @Spec private CommandSpec spec;

  @Option(names = "--json", description = "Print one JSON object and nothing else.")
  private boolean json;

  @Override
  public Integer call() throws IOException {
    PrintWriter out = spec.commandLine().getOut();
    try (Desk desk = Desk.open(shared.jars())) {
      RunPlan plan = candidate.plan(desk.catalogue(), desk.builds(), Goal.optimise());
      Path folder = Files.createTempDirectory("steelyard-solve");
      try {
        return solve(desk, plan, folder, out);
      } finally {
        Folders.delete(folder);
      }
    }
  }

  private int solve(Desk desk, RunPlan plan, Path folder, PrintWriter out) {
    RunMaker maker = new RunMaker(desk.crew(), desk.session(MachineFacts.here()), desk.clock());
    Path run = folder.resolve(plan.run());
    RunRecord record = maker.make(plan, run, List.of(), json ? event -> {} : new Showing(out));
    requireInput(record);
    Optional<JudgeService.Judged> judged = judge(desk, record, folder);
    Check check = judged.map(j -> j.verdict().check()).orElse(Check.UNCHECKED);
    if (json) {
      out.println(
          SolveJson.of(
              record, check, judged.flatMap(JudgeService.Judged::found).map(Verdict::answer)));
    } else {
      print(record, check, judged, out);
    }
    int wanted = check == Check.INVALID ? ExitStatus.FINDING : ExitStatus.OK;
    return desk.signalStatus().orElse(wanted);
  }

  /** A run that came to nothing for what was given is a mistake in what was given. */
  private static void requireInput(RunRecord record) {
    Ending ending = record.outcome().ending();
    if ((record.model().isEmpty() && ending == Ending.CRASHED) || ending == Ending.UNSUPPORTED) {
      throw new HarnessProblem(
          record.outcome().reason().orElse("the run ended without a word: " + ending));
    }
  }

  private static Optional<JudgeService.Judged> judge(Desk desk, RunRecord record, Path folder) {
    if (!record.outcome().hasSolution()) {
      return Optional.empty();
    }
    try (JudgeService judge =
        new JudgeService(
            desk.crew(),
            folder.resolve("judge"),
            Judges.code(desk.crew().installation()),
            JUDGING,
            desk.clock())) {
      return Optional.of(judge.judge(record, folder.resolve(record.run())));
    }
  }

  private static void print(
      RunRecord record, Check check, Optional<JudgeService.Judged> judged, PrintWriter out) {
    out.println();
    out.println(Summaries.outcome(record, check));
    judged
        .filter(j -> check != Check.VALID)
        .ifPresent(j -> Columns.wrapped(out, "  ", Columns.visible(j.verdict().detail())));
    judged
        .flatMap(JudgeService.Judged::found)
        .map(Verdict::shown)
        .filter(shown -> !shown.isEmpty())
        .ifPresent(shown -> out.println("\n" + Columns.visible(shown).stripTrailing()));
  }

  /** Prints solutions and bounds as they come. */
  private static final class Showing implements Consumer<StampedEvent> {
    private final PrintWriter out;
    private long start;

    Showing(PrintWriter out) {
      this.out = out;
    }

    @Override
    public void accept(StampedEvent stamped) {
      if (stamped.event() instanceof Event.Phase phase && phase.name().equals(Phases.LOWER)) {
        start = stamped.nanos();
      } else if (stamped.event() instanceof Event.Solution solution) {
        line(stamped, "solution", solution.objective());
      } else if (stamped.event() instanceof Event.Bound bound) {
        line(stamped, "bound", OptionalLong.of(bound.value()));
      }
    }

    private void line(StampedEvent stamped, String what, OptionalLong value) {
      String number = value.isPresent() ? Long.toString(value.getAsLong()) : "";
      out.println(
          String.format(
                  Locale.ROOT, "%9.3f s  %-8s  %s", (stamped.nanos() - start) / 1e9, what, number)
              .stripTrailing());
    }
  }
}
