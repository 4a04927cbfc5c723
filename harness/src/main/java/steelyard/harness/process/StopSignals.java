package steelyard.harness.process;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicReference;

/**
 * Lets a person end the harness: SIGINT (Ctrl-C), SIGTERM and SIGHUP (a lost terminal).
 *
 * <p>The first signal throws the switch: children are asked to stop and after their grace killed,
 * nothing new starts, what has finished is made durable, and the command returns in its own time
 * with {@link #exitStatus}. A second signal kills all children and ends this process at once.
 * Repeats within half a second of the first are the same request: a closing terminal and {@code
 * timeout} both send theirs twice.
 *
 * <p>Where signals cannot be taken over, and when the JVM ends in another way, a shutdown hook does
 * the first step, waits a bounded time for {@link #close}, and does the second.
 */
public final class StopSignals implements AutoCloseable {
  private enum Kind {
    HUP(1),
    INT(2),
    TERM(15);

    /** POSIX.1-2017, XCU kill, and signal(7). */
    private final int number;

    Kind(int number) {
      this.number = number;
    }
  }

  private static final int SIGNAL_STATUS_BASE = 128;
  private static final long SAME_REQUEST_NANOS = TimeUnit.MILLISECONDS.toNanos(500);
  private static final long CLOSE_WITHIN_SECONDS = 5;

  private record Request(Kind kind, long nanos) {}

  private final StopSwitch stop;
  private final Runnable endAll;
  private final AtomicReference<Request> first = new AtomicReference<>();
  private final List<Runnable> restorations = new ArrayList<>();
  private final CountDownLatch closed = new CountDownLatch(1);
  private final Thread hook = new Thread(this::shutDown, "end children");

  private StopSignals(StopSwitch stop, Runnable endAll) {
    this.stop = stop;
    this.endAll = endAll;
  }

  /**
   * Takes the signals over until closed.
   *
   * @param stop what the first signal throws
   * @param launcher whose children the second one kills
   */
  public static StopSignals install(StopSwitch stop, Launcher launcher) {
    StopSignals signals = new StopSignals(stop, launcher::endAll);
    for (Kind kind : Kind.values()) {
      SignalHook.install(kind.name(), () -> signals.receive(kind))
          .ifPresent(signals.restorations::add);
    }
    Runtime.getRuntime().addShutdownHook(signals.hook);
    return signals;
  }

  private void receive(Kind kind) {
    Request request = new Request(kind, System.nanoTime());
    if (first.compareAndSet(null, request)) {
      stop.stop();
    } else if (request.nanos() - first.get().nanos() > SAME_REQUEST_NANOS) {
      stop.kill();
      endAll.run();
      Runtime.getRuntime().halt(SIGNAL_STATUS_BASE + kind.number);
    }
  }

  private void shutDown() {
    stop.stop();
    try {
      if (closed.await(CLOSE_WITHIN_SECONDS, TimeUnit.SECONDS)) {
        return;
      }
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
    stop.kill();
    endAll.run();
  }

  /** The exit status by which shells tell that a signal ended a command; empty if none came. */
  public OptionalInt exitStatus() {
    return Optional.ofNullable(first.get())
        .map(request -> OptionalInt.of(SIGNAL_STATUS_BASE + request.kind().number))
        .orElse(OptionalInt.empty());
  }

  /** Gives the signals back. All that must survive has been written. */
  @Override
  public void close() {
    restorations.forEach(Runnable::run);
    closed.countDown();
    try {
      Runtime.getRuntime().removeShutdownHook(hook);
    } catch (IllegalStateException e) {
      return; // the JVM is ending: the hook is the one that waits for this
    }
  }
}
