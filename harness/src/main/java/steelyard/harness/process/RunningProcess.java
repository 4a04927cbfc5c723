package steelyard.harness.process;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.concurrent.TimeUnit;

/** A child that was started, and what can be asked of it. */
public final class RunningProcess {
  /** Written to the lifeline to ask the child to end. */
  static final String STOP_REQUEST = "stop";

  /** After a kill only the kernel can hold a process, and not for this long. */
  private static final long END_WITHIN_NANOS = TimeUnit.SECONDS.toNanos(5);

  private final Process process;
  private final Launch launch;
  private final long startNanos;
  private final Kin kin;
  private final Launcher launcher;
  private final Optional<LiveTable.Entry> entry;

  RunningProcess(
      Process process,
      Launch launch,
      String tag,
      long startNanos,
      long earliestTicks,
      Launcher launcher,
      Optional<LiveTable.Entry> entry) {
    this.process = process;
    this.launch = launch;
    this.startNanos = startNanos;
    this.kin = new Kin(ProcFs.SYSTEM, new ProcessId(process.pid(), earliestTicks), tag);
    this.launcher = launcher;
    this.entry = entry;
  }

  public long pid() {
    return process.pid();
  }

  public Launch launch() {
    return launch;
  }

  /** {@link System#nanoTime} just before the start; on Linux the same clock in every process. */
  public long startNanos() {
    return startNanos;
  }

  /** Asks the child to end. Nothing happens if it has ended or does not read. */
  public void askToStop() {
    tell(STOP_REQUEST);
  }

  /** Writes a line to the child's lifeline. Nothing happens if it has ended or does not read. */
  public void tell(String line) {
    try {
      process.getOutputStream().write((line + "\n").getBytes(StandardCharsets.UTF_8));
      process.getOutputStream().flush();
    } catch (IOException e) {
      return; // the child has closed its end: there is nobody left to ask
    }
  }

  /** Waits for the first process to end; whether it did in time. */
  boolean awaitFirst(long nanos) throws InterruptedException {
    return process.waitFor(nanos, TimeUnit.NANOSECONDS);
  }

  /** All processes of this child that are alive. */
  synchronized List<ProcStat> alive() {
    return kin.look();
  }

  /** Kills all processes of this child and waits, within a bound, until they are gone. */
  synchronized Kin.Ended end() {
    Kin.Ended ended = kin.end(launcher.tools(), END_WITHIN_NANOS);
    if (ended.left() == 0) {
      entry.ifPresent(LiveTable.Entry::leave);
      launcher.forget(this);
    }
    return ended;
  }

  public boolean isAlive() {
    return process.isAlive();
  }

  /** Ends a child that serves and is not watched. */
  public void endNow() {
    end();
  }

  /** The exit code, or 128 + the signal, as soon as the first process has been waited for. */
  OptionalInt code() {
    return process.isAlive() ? OptionalInt.empty() : OptionalInt.of(process.exitValue());
  }
}
