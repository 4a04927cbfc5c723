package steelyard.results.brief;

import java.util.Objects;
import steelyard.results.statistics.TieMargin;

/**
 * The choices behind the numbers, fixed before the runs are looked at and stated on every page.
 *
 * @param margin within what distance two times tie
 * @param penaltyFactor what a run without an answer counts as, in limits; at least 1
 * @param shiftSeconds the shift of the geometric mean; positive
 * @param floorSeconds the shortest time that a ratio or a chart takes at its word; positive
 */
public record Rules(
    TieMargin margin, double penaltyFactor, double shiftSeconds, double floorSeconds) {

  /** Ties within 5 % or 0.05 s, twice the limit as the penalty, a shift of 1 s, a floor of 1 ms. */
  public static final Rules STANDARD = new Rules(new TieMargin(0.05, 0.05), 2, 1, 0.001);

  public Rules {
    Objects.requireNonNull(margin, "margin");
    if (!(penaltyFactor >= 1)) {
      throw new IllegalArgumentException("penalty factor must be at least 1: " + penaltyFactor);
    }
    if (!(shiftSeconds > 0) || !(floorSeconds > 0)) {
      throw new IllegalArgumentException(
          "shift and floor must be positive, were " + shiftSeconds + " and " + floorSeconds);
    }
  }
}
