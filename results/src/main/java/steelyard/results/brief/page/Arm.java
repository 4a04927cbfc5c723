package steelyard.results.brief.page;

import java.util.Locale;
import java.util.OptionalDouble;
import steelyard.results.brief.Facts.Against;
import steelyard.results.statistics.TieMargin;

/**
 * Where does the poise hang? The ratio of two penalised means as a place on a steelyard's graduated
 * arm, from a tenth to tenfold on a logarithmic scale with 1 in the middle.
 *
 * @param ratio after over before
 * @param ties whether the two are too close to call
 */
public record Arm(double ratio, boolean ties) {

  private static final double MIDDLE = 60;
  private static final double DECADE = 50;

  /** The arm of a comparison; without a ratio if either mean is missing or nothing. */
  static OptionalDouble ratio(Against against) {
    OptionalDouble before = against.penalisedBefore();
    OptionalDouble after = against.penalisedAfter();
    boolean known = before.isPresent() && after.isPresent() && before.getAsDouble() > 0;
    return known
        ? OptionalDouble.of(after.getAsDouble() / before.getAsDouble())
        : OptionalDouble.empty();
  }

  /** Whether a comparison can be hung on an arm. */
  public static boolean hangs(Against against) {
    return ratio(against).orElse(0) > 0;
  }

  /** The arm of a comparison that can be hung on one. */
  public static Arm of(Against against, TieMargin margin) {
    return new Arm(
        ratio(against).orElseThrow(),
        margin.ties(
            against.penalisedBefore().getAsDouble(), against.penalisedAfter().getAsDouble()));
  }

  /** The poise's place, in hundredths of the drawing's unit at most. */
  public String poise() {
    double decades = Math.max(-1, Math.min(1, StrictMath.log10(ratio)));
    return String.format(Locale.ROOT, "%.2f", MIDDLE + decades * DECADE);
  }

  /** The style of the poise. */
  public String side() {
    return ties ? "even" : ratio < 1 ? "better" : "worse";
  }
}
