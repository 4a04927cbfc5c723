package steelyard.adapters.spi;

import java.util.Objects;

/**
 * An amount of a backend's deterministic work.
 *
 * @param unit one of the backend's {@link Description#workUnits()}
 * @param amount positive
 */
public record Work(String unit, double amount) {
  public Work {
    Objects.requireNonNull(unit, "unit");
    if (!(amount > 0)) {
      throw new IllegalArgumentException("work must be positive, was " + amount);
    }
  }
}
