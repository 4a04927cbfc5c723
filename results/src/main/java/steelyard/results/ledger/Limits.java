package steelyard.results.ledger;

import java.util.Objects;
import java.util.Optional;

/**
 * What a run was allowed.
 *
 * @param wallSeconds positive; under a work limit it is the safety net
 * @param work empty for a wall-limited run
 * @param memoryBytes positive; all of the run's processes together
 */
public record Limits(double wallSeconds, Optional<Work> work, long memoryBytes) {

  /**
   * An amount of the backend's own deterministic work.
   *
   * @param unit such as {@code conflicts}
   * @param amount positive
   */
  public record Work(String unit, double amount) {
    public Work {
      Objects.requireNonNull(unit, "unit");
      if (!(amount > 0)) {
        throw new IllegalArgumentException("work amount must be positive, was " + amount);
      }
    }
  }

  public Limits {
    Objects.requireNonNull(work, "work");
    if (!(wallSeconds > 0)) {
      throw new IllegalArgumentException("wall limit must be positive, was " + wallSeconds);
    }
    if (memoryBytes <= 0) {
      throw new IllegalArgumentException("memory limit must be positive, was " + memoryBytes);
    }
  }
}
