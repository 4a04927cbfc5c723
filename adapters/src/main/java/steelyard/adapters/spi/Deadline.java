package steelyard.adapters.spi;

import java.util.Optional;

/** When to stop. Safe to ask from any thread. */
public interface Deadline {
  /** Nanoseconds until the wall limit; 0 or less when it has passed. */
  long nanosLeft();

  /** The work limit, if the run has one. */
  Optional<Work> work();

  /** Whether somebody asked the run to stop, or the wall limit has passed. Cheap enough to poll. */
  boolean stopAsked();

  /**
   * Registers what makes a blocking solver return. It is run when a stop is asked or the wall limit
   * passes, and again every 50 ms until {@link Lowering#solve} returns, because two libraries lose
   * a stop that comes before they have started. Replaces what was registered before.
   */
  void onStop(Runnable wake);
}
