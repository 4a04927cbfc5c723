package steelyard.harness.process;

import java.util.Optional;
import java.util.OptionalLong;
import java.util.concurrent.TimeUnit;
import steelyard.harness.process.Exit.Reason;
import steelyard.harness.process.StopSwitch.Position;

/**
 * Holds one child to its limits, from its start until none of its processes is left.
 *
 * <p>It looks every 50 ms and whenever a limit falls due. When the main clock reaches the wall
 * limit, or somebody throws the switch, the child is asked to stop and, after the grace, killed;
 * too much memory or a phase beyond its allowance kill at once. The first reason stands.
 */
public final class Watch {
  private static final long LOOK_EVERY_NANOS = TimeUnit.MILLISECONDS.toNanos(50);
  private static final long CODE_WITHIN_NANOS = TimeUnit.SECONDS.toNanos(5);

  private final RunningProcess child;
  private final Launch launch;
  private final ProcessLimits limits;
  private final PhaseSource phases;
  private final StopSwitch stop;
  private final PhaseClocks clocks;
  private final Meter meter;
  private long lastLook;
  private Optional<Reason> reason = Optional.empty();
  private OptionalLong killAt = OptionalLong.empty();
  private boolean asked;
  private boolean killed;

  /** A watch over a child just started; the switch ends this and other children early. */
  public Watch(RunningProcess child, ProcessLimits limits, PhaseSource phases, StopSwitch stop) {
    this.child = child;
    this.launch = child.launch();
    this.limits = limits;
    this.phases = phases;
    this.stop = stop;
    this.lastLook = child.startNanos();
    this.clocks = new PhaseClocks(limits, lastLook);
    this.meter = new Meter(ProcFs.SYSTEM, lastLook);
  }

  /**
   * Waits for the end, and brings it about where a limit says so. An interrupt of this thread kills
   * the child and stays set. Whatever happens, even an exception of the phase source, no process of
   * the child is left running.
   */
  public Exit await() {
    boolean interrupted = false;
    Kin.Ended ended;
    long endNanos;
    try {
      interrupted = interruptedBeforeTheEnd();
    } finally {
      endNanos = System.nanoTime();
      ended = child.end();
    }
    if (ended.found() > 0) {
      endNanos = System.nanoTime();
    }
    if (stop.position() == Position.KILL && reason.isEmpty()) {
      kill(Reason.STOPPED); // it was ended between two looks, by the one who threw the switch
    }
    takeMarks(endNanos);
    clocks.stopAt(endNanos);
    interrupted |= interruptedBeforeTheCode();
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
    return exit(endNanos, ended);
  }

  /** Looks until the first process has ended or all are to be killed. */
  private boolean interruptedBeforeTheEnd() {
    try {
      look();
      while (!killed && !child.awaitFirst(untilNextLook())) {
        look();
      }
      return false;
    } catch (InterruptedException e) {
      kill(Reason.STOPPED);
      return true;
    }
  }

  /** The code of a process is known a moment after it has gone. */
  private boolean interruptedBeforeTheCode() {
    try {
      child.awaitFirst(CODE_WITHIN_NANOS);
      return false;
    } catch (InterruptedException e) {
      return true;
    }
  }

  private void look() {
    long now = System.nanoTime();
    takeMarks(now);
    long resident = meter.look(child.alive(), now);
    OutputFile.cut(launch.stdout(), limits.outputBytes());
    OutputFile.cut(launch.stderr(), limits.outputBytes());
    lastLook = now;
    enforceClock(now);
    enforceSwitch(now);
    if (resident > limits.memoryBytes()) {
      kill(Reason.MEMORY);
    }
  }

  private void takeMarks(long now) {
    for (PhaseMark mark : phases.newMarks()) {
      clocks.mark(mark, lastLook, now);
    }
  }

  private void enforceClock(long now) {
    long left = clocks.nanosLeft(now);
    if (left > 0) {
      return;
    }
    if (!clocks.clock().main()) {
      kill(Reason.PHASE);
    } else if (left + limits.grace().toNanos() > 0) {
      ask(Reason.WALL);
    } else {
      kill(Reason.WALL);
    }
  }

  private void enforceSwitch(long now) {
    Position position = stop.position();
    if (position == Position.KILL || (killAt.isPresent() && now - killAt.getAsLong() >= 0)) {
      kill(Reason.STOPPED);
    } else if (position == Position.STOP && killAt.isEmpty()) {
      killAt = OptionalLong.of(now + limits.grace().toNanos());
      ask(Reason.STOPPED);
    }
  }

  private void ask(Reason why) {
    if (!asked) {
      asked = true;
      reason = reason.or(() -> Optional.of(why));
      child.askToStop();
    }
  }

  private void kill(Reason why) {
    killed = true;
    reason = reason.or(() -> Optional.of(why));
  }

  private long untilNextLook() {
    long now = System.nanoTime();
    long left = clocks.nanosLeft(now);
    if (clocks.clock().main() && left <= 0) {
      left += limits.grace().toNanos();
    }
    long due = killAt.isPresent() ? Math.min(left, killAt.getAsLong() - now) : left;
    return Math.max(0, Math.min(due, LOOK_EVERY_NANOS));
  }

  private Exit exit(long endNanos, Kin.Ended ended) {
    String stderr = OutputFile.tail(launch.stderr());
    OutputFile.shorten(launch.stdout(), limits.outputBytes());
    OutputFile.shorten(launch.stderr(), limits.outputBytes());
    long mainNanos = clocks.mainNanos();
    return new Exit(
        child.code(),
        reason,
        killed,
        clocks.phase(),
        endNanos - child.startNanos(),
        mainNanos,
        Math.max(0, mainNanos - limits.wall().toNanos()),
        meter.usage(),
        killed ? 0 : ended.found(),
        ended.left(),
        clocks.marks(),
        stderr);
  }
}
