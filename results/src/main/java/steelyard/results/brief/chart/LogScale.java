package steelyard.results.brief.chart;

import java.util.ArrayList;
import java.util.List;

/**
 * Where on an axis does a time lie? Logarithmic from the lowest time to the limit, then a rail for
 * what had not ended by then.
 *
 * @param lowest seconds at the axis's start, positive
 * @param limit seconds at the end of its logarithmic part, above the lowest
 * @param length of the whole axis, in drawing units
 * @param rail width of the rail at its end, in drawing units, less than the length
 */
record LogScale(double lowest, double limit, int length, int rail) {

  private static final int CLOSEST_TICKS = 44;

  LogScale {
    if (!(lowest > 0 && limit > lowest && rail >= 0 && length > rail)) {
      throw new IllegalArgumentException(
          "no scale from " + lowest + " to " + limit + " s on " + length + " with rail " + rail);
    }
  }

  /**
   * A scale that holds all these times.
   *
   * @param shortest the shortest measured time; anything not positive if there is none
   * @param floor the lowest time that is worth telling apart
   */
  static LogScale covering(double shortest, double floor, double limit, int length, int rail) {
    double from = shortest > 0 ? Math.max(shortest, floor) : limit / 10;
    double decade = decadeBelow(Math.min(from, limit / 5));
    return new LogScale(decade, limit, length, rail);
  }

  private static double decadeBelow(double seconds) {
    return StrictMath.pow(10, Math.floor(StrictMath.log10(seconds) + 1e-9));
  }

  /** The distance of a time from the axis's start; times below the lowest lie there. */
  double at(double seconds) {
    return StrictMath.log10(Math.max(seconds, lowest) / lowest) * unitsPerDecade();
  }

  /** The time that would lie at the axis's end if the rail went on like the rest. */
  double end() {
    return timeAt(length);
  }

  /** The time that would lie in the middle of the rail. */
  double railMiddle() {
    return timeAt(length - rail / 2.0);
  }

  private double timeAt(double distance) {
    return lowest * StrictMath.pow(10, distance / unitsPerDecade());
  }

  private double unitsPerDecade() {
    return (length - rail) / StrictMath.log10(limit / lowest);
  }

  /** The decades from the lowest time on that leave room for the limit's own label. */
  List<Double> ticks() {
    List<Double> ticks = new ArrayList<>();
    for (int i = 0; at(tick(i)) <= at(limit) - CLOSEST_TICKS; i++) {
      ticks.add(tick(i));
    }
    return ticks;
  }

  private double tick(int index) {
    return lowest * StrictMath.pow(10, index);
  }
}
