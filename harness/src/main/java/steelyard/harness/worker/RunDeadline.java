package steelyard.harness.worker;

import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Work;

/** The limit of one run: its main clock, its work, and the harness's word. */
final class RunDeadline implements Deadline, AutoCloseable {
  private static final long WAKE_AGAIN_NANOS = TimeUnit.MILLISECONDS.toNanos(50);

  private final long endNanos;
  private final Optional<Work> work;
  private final Lifeline lifeline;
  private volatile Runnable wake = () -> {};
  private volatile boolean closed;
  private boolean watched;

  /** The main clock starts now. */
  RunDeadline(double wallSeconds, Optional<Work> work, Lifeline lifeline) {
    this.endNanos = System.nanoTime() + (long) (wallSeconds * 1e9);
    this.work = work;
    this.lifeline = lifeline;
  }

  @Override
  public long nanosLeft() {
    return endNanos - System.nanoTime();
  }

  @Override
  public Optional<Work> work() {
    return work;
  }

  @Override
  public boolean stopAsked() {
    return lifeline.stopAsked() || nanosLeft() <= 0;
  }

  @Override
  public synchronized void onStop(Runnable wake) {
    this.wake = wake;
    if (!watched) {
      watched = true;
      Thread thread = new Thread(this::watch, "deadline");
      thread.setDaemon(true);
      thread.start();
      lifeline.wakeOnStop(thread);
    }
  }

  private void watch() {
    while (!closed) {
      if (stopAsked()) {
        wake.run();
        LockSupport.parkNanos(WAKE_AGAIN_NANOS);
      } else {
        LockSupport.parkNanos(nanosLeft());
      }
    }
  }

  /** No wake runs after the solve has returned. */
  @Override
  public void close() {
    closed = true;
  }
}
