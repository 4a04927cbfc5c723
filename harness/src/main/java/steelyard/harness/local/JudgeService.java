package steelyard.harness.local;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.WorkerTask;
import steelyard.harness.process.RunningProcess;
import steelyard.harness.worker.Verdict;
import steelyard.harness.worker.Wire;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.RunRecord;

/**
 * Has solutions judged by long-lived processes apart from the runs, one for each version of a
 * family. A judge that hangs or dies is ended and started anew; what it was asked then stays
 * unchecked.
 */
public final class JudgeService implements AutoCloseable {
  private static final Duration LIFE = Duration.ofDays(30);
  private static final long MEMORY_BYTES = 2L << 30;
  private static final double HEAP_SHARE = 0.6;
  private static final long LOOK_EVERY_NANOS = TimeUnit.MILLISECONDS.toNanos(2);

  private final Crew crew;
  private final Path folder;
  private final Digest code;
  private final Duration limit;
  private final Clock clock;
  private final Map<Optional<String>, RunningProcess> processes = new HashMap<>();

  /**
   * A judge that is started when it is first asked.
   *
   * @param folder where its process works
   * @param code digest of the code that judges
   * @param limit how long one run's solutions may take
   */
  public JudgeService(Crew crew, Path folder, Digest code, Duration limit, Clock clock) {
    this.crew = crew;
    this.folder = folder;
    this.code = code;
    this.limit = limit;
    this.clock = clock;
  }

  /**
   * What was found.
   *
   * @param verdict for the ledger
   * @param found in full; empty if the judge gave no answer
   */
  public record Judged(steelyard.results.ledger.Verdict verdict, Optional<Verdict> found) {}

  /** Judges the solutions of a run, whose files lie in {@code runFolder}. */
  public synchronized Judged judge(RunRecord record, Path runFolder) {
    String run = record.run();
    Optional<Verdict> found = ask(record.recipe().alias(), runFolder);
    if (found.isEmpty()) {
      return judged(run, Check.UNCHECKED, "the judge gave no answer within " + limit, found);
    }
    Verdict verdict = found.get();
    String problems = String.join("\n", verdict.problems());
    Check check =
        verdict.judged() == 0
            ? Check.UNCHECKED
            : verdict.problems().isEmpty() ? Check.VALID : Check.INVALID;
    return judged(run, check, problems, found);
  }

  private Judged judged(String run, Check check, String detail, Optional<Verdict> found) {
    return new Judged(
        new steelyard.results.ledger.Verdict(run, code, check, detail, clock.instant()), found);
  }

  private Optional<Verdict> ask(Optional<String> alias, Path runFolder) {
    Path file = runFolder.resolve(Wire.VERDICT);
    RunningProcess judge = processes.computeIfAbsent(alias, this::start);
    judge.tell(runFolder.toString());
    long end = System.nanoTime() + limit.toNanos();
    while (!Files.exists(file) && System.nanoTime() - end < 0 && judge.isAlive()) {
      LockSupport.parkNanos(LOOK_EVERY_NANOS);
    }
    try {
      if (Files.exists(file)) {
        return Optional.of(Wire.readVerdict(file));
      }
    } catch (IOException e) {
      // Not a verdict: as if there were none.
      end(alias);
      return Optional.empty();
    }
    end(alias);
    return Optional.empty();
  }

  private RunningProcess start(Optional<String> alias) {
    return crew.start(
        new WorkerTask(
            "judge",
            List.of("judge"),
            alias.map(name -> folder.resolve("version-" + name)).orElse(folder),
            crew.installation().withoutBackends(alias),
            "",
            HEAP_SHARE,
            1,
            List.of(),
            Crew.service(LIFE, MEMORY_BYTES)));
  }

  private void end(Optional<String> alias) {
    Optional.ofNullable(processes.remove(alias)).ifPresent(RunningProcess::endNow);
  }

  @Override
  public synchronized void close() {
    List.copyOf(processes.keySet()).forEach(this::end);
  }
}
