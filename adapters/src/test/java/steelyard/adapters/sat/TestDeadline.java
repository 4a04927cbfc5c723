package steelyard.adapters.sat;

import java.util.Optional;
import java.util.concurrent.atomic.AtomicLong;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Work;

/** A deadline without a clock: it says stop from a given look on. */
final class TestDeadline implements Deadline {
  private final AtomicLong looksLeft;
  private final Optional<Work> work;
  private Runnable wake = () -> {};

  private TestDeadline(long looksLeft, Optional<Work> work) {
    this.looksLeft = new AtomicLong(looksLeft);
    this.work = work;
  }

  static TestDeadline none() {
    return new TestDeadline(Long.MAX_VALUE, Optional.empty());
  }

  static TestDeadline afterLooks(long looks) {
    return new TestDeadline(looks, Optional.empty());
  }

  static TestDeadline work(String unit, double amount) {
    return new TestDeadline(Long.MAX_VALUE, Optional.of(new Work(unit, amount)));
  }

  /** What the harness does when somebody asks the run to stop. */
  void stop() {
    looksLeft.set(0);
    wake.run();
  }

  @Override
  public long nanosLeft() {
    return Long.MAX_VALUE;
  }

  @Override
  public Optional<Work> work() {
    return work;
  }

  @Override
  public boolean stopAsked() {
    return looksLeft.getAndUpdate(left -> Math.max(0, left - 1)) <= 0;
  }

  @Override
  public void onStop(Runnable wake) {
    this.wake = wake;
  }
}
