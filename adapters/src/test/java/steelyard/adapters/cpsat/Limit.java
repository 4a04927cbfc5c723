package steelyard.adapters.cpsat;

import java.util.Optional;
import java.util.concurrent.TimeUnit;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Work;

/** A deadline for tests: a wall limit from its making on, a work limit, a stop by hand. */
final class Limit implements Deadline {
  private final long end;
  private final Optional<Work> work;
  private volatile boolean stopped;
  private volatile Runnable wake = () -> {};

  private Limit(long nanos, Optional<Work> work) {
    this.end = System.nanoTime() + nanos;
    this.work = work;
  }

  /** No limit but one that only a hanging test meets. */
  static Limit none() {
    return wallSeconds(120);
  }

  static Limit wallSeconds(double seconds) {
    return new Limit((long) (seconds * TimeUnit.SECONDS.toNanos(1)), Optional.empty());
  }

  static Limit work(String unit, double amount) {
    return new Limit(TimeUnit.MINUTES.toNanos(2), Optional.of(new Work(unit, amount)));
  }

  /** Asks to stop, as somebody else would: once, and again every few milliseconds. */
  void stop() {
    stopped = true;
    wake.run();
  }

  @Override
  public long nanosLeft() {
    return end - System.nanoTime();
  }

  @Override
  public Optional<Work> work() {
    return work;
  }

  @Override
  public boolean stopAsked() {
    return stopped || nanosLeft() <= 0;
  }

  @Override
  public void onStop(Runnable wake) {
    this.wake = wake;
  }
}
