package steelyard.harness.local;

import java.time.Clock;
import java.time.Duration;
import java.util.List;
import java.util.Optional;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.Errands;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.launch.WorkerTask;
import steelyard.harness.process.MachineLoad;
import steelyard.harness.worker.Event;
import steelyard.results.ledger.Calibration;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Session;

/**
 * Times the fixed task between blocks, so seldom that it takes at most a twentieth of the night;
 * the one after a block is the one before the next.
 */
final class Calibrating {
  private static final int LEAST_BETWEEN = 20;
  private static final Duration WITHIN = Duration.ofSeconds(60);
  private static final long MEMORY_BYTES = 512L << 20;
  private static final double HEAP_SHARE = 0.5;

  private final Crew crew;
  private final Ledger ledger;
  private final Session session;
  private final Clock clock;
  private long dueNanos = System.nanoTime();

  Calibrating(Crew crew, Ledger ledger, Session session, Clock clock) {
    this.crew = crew;
    this.ledger = ledger;
    this.session = session;
    this.clock = clock;
  }

  /** Measures on these logical processors if the last measurement is long enough ago. */
  synchronized void ifDue(List<Integer> processors) {
    if (System.nanoTime() - dueNanos < 0 || crew.stop().stopping()) {
      return;
    }
    MachineLoad before = MachineLoad.now();
    long start = System.nanoTime();
    WorkerEnd end =
        Errands.once(
            crew,
            folder ->
                new WorkerTask(
                    "calibrate",
                    List.of("calibrate"),
                    folder,
                    crew.installation().withoutBackends(Optional.empty()),
                    "",
                    HEAP_SHARE,
                    1,
                    processors,
                    Crew.service(WITHIN, MEMORY_BYTES)));
    long took = System.nanoTime() - start;
    dueNanos = System.nanoTime() + LEAST_BETWEEN * took;
    Optional<Event.Calibrated> calibrated = end.last(Event.Calibrated.class);
    MachineLoad after = MachineLoad.now();
    calibrated.ifPresent(
        it ->
            ledger
                .sessions()
                .addCalibration(
                    session.id(),
                    new Calibration(
                        clock.instant(),
                        it.nanos(),
                        (long) (after.stolenSince(before) * took),
                        after.swappedPagesSince(before))));
  }
}
