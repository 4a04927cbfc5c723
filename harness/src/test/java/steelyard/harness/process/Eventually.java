package steelyard.harness.process;

import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import java.util.function.BooleanSupplier;

/** Waits for what another process brings about. */
public final class Eventually {
  private static final long DEADLINE_NANOS = TimeUnit.SECONDS.toNanos(120);

  private Eventually() {}

  /** Looks again and again until the condition holds; false once two minutes have passed. */
  public static boolean holds(BooleanSupplier condition) {
    long from = System.nanoTime();
    while (!condition.getAsBoolean()) {
      if (System.nanoTime() - from > DEADLINE_NANOS) {
        return false;
      }
      LockSupport.parkNanos(5_000_000);
    }
    return true;
  }
}
