package steelyard.results.ledger;

import java.time.Instant;

/**
 * How long the fixed calibration task took between blocks.
 *
 * @param at when it ended
 * @param nanos how long it took
 * @param stealNanos processor time that the hypervisor took away meanwhile
 * @param swappedPages pages swapped in and out meanwhile
 */
public record Calibration(Instant at, long nanos, long stealNanos, long swappedPages) {
  public Calibration {
    Text.require("at", at);
    if (nanos <= 0 || stealNanos < 0 || swappedPages < 0) {
      throw new IllegalArgumentException(
          "calibration of %d ns, %d ns stolen, %d pages swapped"
              .formatted(nanos, stealNanos, swappedPages));
    }
  }
}
