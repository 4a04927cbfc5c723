package steelyard.harness.local;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import java.util.concurrent.TimeUnit;
import java.util.function.Consumer;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.Folders;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.process.CoreLeases;
import steelyard.harness.sweep.Block;
import steelyard.harness.sweep.Candidate;
import steelyard.results.ledger.CellId;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Collector;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Place;
import steelyard.results.ledger.RunKey;
import steelyard.results.ledger.RunRecord;
import steelyard.results.ledger.Session;
import steelyard.results.ledger.Sweep;

/**
 * Carries a sweep out on this machine: block after block, as many at a time as there are cores for,
 * each run durable before the next starts. What is finished is never made again: the same sweep
 * goes on where it stood.
 */
public final class SweepRun {
  /** How long one run's solutions may take to judge. */
  private static final Duration JUDGING = Duration.ofSeconds(60);

  private final Crew crew;
  private final Ledger ledger;
  private final Session session;
  private final CoreLeases leases;
  private final Clock clock;
  private final SweepListener listener;

  public SweepRun(
      Crew crew,
      Ledger ledger,
      Session session,
      CoreLeases leases,
      Clock clock,
      SweepListener listener) {
    this.crew = crew;
    this.ledger = ledger;
    this.session = session;
    this.leases = leases;
    this.clock = clock;
    this.listener = listener;
  }

  /**
   * Runs what of the sweep is not finished.
   *
   * @param keyed the plan with the keys of its runs
   * @param file the text of the sweep file
   * @param folder takes the folders of runs
   * @param judge digest of the code that judges
   * @param begun told the sweep before its first run
   * @return the sweep, as the ledger has it; unfinished if it was stopped
   */
  public Sweep carryOut(
      KeyedPlan keyed, String file, Path folder, Digest judge, Consumer<Sweep> begun) {
    Sweep sweep = new SweepBook(ledger, clock).sweep(keyed, file);
    begun.accept(sweep);
    Path runs = folder.resolve("runs");
    try (JudgeService judging =
        new JudgeService(crew, folder.resolve("judge"), judge, JUDGING, clock)) {
      Files.createDirectories(runs);
      Task task = new Task(keyed, sweep, runs, judging, judge);
      task.catchUp();
      task.run();
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write to " + runs, e);
    }
    return sweep;
  }

  /** One carrying out. */
  private final class Task {
    private final KeyedPlan keyed;
    private final Sweep sweep;
    private final Path runs;
    private final JudgeService judging;
    private final Digest judge;
    private final Calibrating calibrating;

    Task(KeyedPlan keyed, Sweep sweep, Path runs, JudgeService judging, Digest judge) {
      this.keyed = keyed;
      this.sweep = sweep;
      this.runs = runs;
      this.judging = judging;
      this.judge = judge;
      this.calibrating = new Calibrating(crew, ledger, session, clock);
    }

    /** Brings in what a harness that was killed had finished, and judges what it had not. */
    void catchUp() throws IOException {
      new Collector(ledger).collect(runs);
      for (String run : ledger.judging().unjudged(sweep.id(), judge)) {
        if (Files.isDirectory(runs.resolve(run))) {
          judge(ledger.runs().record(run));
        }
      }
      ledger.progress().reuse(sweep.id(), session.machineClass());
    }

    void run() {
      Set<CellId> finished = new TreeSet<>(ledger.progress().finished(sweep.id()));
      listener.planned(keyed.plan().summary().runs(), finished.size());
      int atATime = Math.max(1, Math.min(leases.slots(), keyed.plan().sweep().cores()));
      ExecutorService hands = Executors.newFixedThreadPool(atATime);
      try {
        List<Future<?>> blocks = new ArrayList<>();
        for (Block block : keyed.plan().blocks()) {
          if (!isFinished(block, finished)) {
            blocks.add(hands.submit(() -> run(block, finished)));
          }
        }
        for (Future<?> block : blocks) {
          block.get();
        }
      } catch (ExecutionException e) {
        crew.stop().stop();
        throw e.getCause() instanceof RuntimeException problem
            ? problem
            : new HarnessProblem("a block failed: " + e.getCause(), e);
      } catch (InterruptedException e) {
        crew.stop().stop();
        Thread.currentThread().interrupt();
      } finally {
        hands.shutdown();
        awaitIdle(hands);
      }
    }

    private void awaitIdle(ExecutorService hands) {
      boolean interrupted = false;
      while (true) {
        try {
          if (hands.awaitTermination(1, TimeUnit.MINUTES)) {
            break;
          }
        } catch (InterruptedException e) {
          interrupted = true;
          crew.stop().kill();
        }
      }
      if (interrupted) {
        Thread.currentThread().interrupt();
      }
    }

    private boolean isFinished(Block block, Set<CellId> finished) {
      for (int position = 0; position < block.order().size(); position++) {
        if (!finished.contains(new CellId(block.number(), position))) {
          return false;
        }
      }
      return true;
    }

    private void run(Block block, Set<CellId> finished) {
      int threads = block.order().stream().mapToInt(c -> c.setup().threads()).max().orElse(1);
      if (crew.stop().stopping()) {
        return;
      }
      try (CoreLeases.Lease lease = leases.take(Math.min(threads, leases.slots()))) {
        calibrating.ifDue(lease.processors());
        Set<RunKey> made = new HashSet<>();
        for (int position = 0; position < block.order().size(); position++) {
          CellId cell = new CellId(block.number(), position);
          RunKey key = keyed.key(block, block.order().get(position));
          if (crew.stop().stopping()) {
            return;
          }
          boolean first = made.add(key);
          if (finished.contains(cell)) {
            continue;
          }
          // Equal models run once in a block; the others are booked as the same run.
          if (first) {
            make(block, position, key, lease.processors());
          } else {
            listener.skipped();
          }
        }
        calibrating.ifDue(lease.processors());
      } catch (IOException e) {
        throw HarnessProblem.of("cannot lease a core", e);
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
      }
    }

    private void make(Block block, int position, RunKey key, List<Integer> processors)
        throws IOException {
      Candidate candidate = block.order().get(position);
      RunPlan plan =
          new RunPlan(
              RunIds.next(),
              key,
              0,
              Optional.of(new Place(sweep.id(), sweep.name(), block.number(), position)),
              block.contest().recipe(candidate, block.instance()),
              candidate.setup(),
              Goal.optimise(),
              block.seed(),
              keyed.plainCanonical(block, candidate),
              keyed.plan().sweep().build(),
              keyed.heapShare(candidate));
      listener.started(plan.run(), candidate.name(), block.instance().name());
      RunRecord record =
          new RunMaker(crew, session, clock)
              .make(plan, runs.resolve(plan.run()), processors, event -> {});
      ledger.runs().collect(record);
      if (record.outcome().ending() != Ending.STOPPED) {
        Check check = judge(record);
        listener.finished(record, check);
      }
    }

    private Check judge(RunRecord record) throws IOException {
      Path folder = runs.resolve(record.run());
      Check check = Check.UNCHECKED;
      if (record.outcome().hasSolution()) {
        JudgeService.Judged judged = judging.judge(record, folder);
        ledger.judging().add(judged.verdict());
        check = judged.verdict().check();
      }
      boolean worthKeeping = check == Check.INVALID || record.outcome().ending() == Ending.CRASHED;
      if (!worthKeeping) {
        Folders.delete(folder);
      }
      return check;
    }
  }
}
