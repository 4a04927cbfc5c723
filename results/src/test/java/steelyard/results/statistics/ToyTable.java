package steelyard.results.statistics;

import java.util.Arrays;
import java.util.List;

/**
 * Three candidates on six instances under a limit of 60 s; NaN is a run that hit it. Every number
 * derived from it in the tests was computed by hand as exact fractions.
 */
final class ToyTable {

  static final double LIMIT = 60;
  private static final double OPEN = Double.NaN;

  static final double[] A = {1, 4, 20, OPEN, 0.5, 50};
  static final double[] B = {2, 2, 30, 40, OPEN, 12};
  static final double[] C = {8, 16, OPEN, 30, 4, OPEN};

  private ToyTable() {}

  static SolveTime time(double seconds) {
    return Double.isNaN(seconds) ? SolveTime.beyond(LIMIT) : SolveTime.exactly(seconds);
  }

  /** One run per instance. */
  static List<List<SolveTime>> instances(double[] seconds) {
    return Arrays.stream(seconds).mapToObj(s -> List.of(time(s))).toList();
  }
}
