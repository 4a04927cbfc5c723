package steelyard.results.statistics;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * How many times as long after took as before, as far as the limits let one say.
 *
 * <p>If only one of the two answered, the limit bounds the ratio from one side; if neither did,
 * there is nothing to say. Dropping such pairs would bias the ratio towards 1, and taking the limit
 * for a time would too: the bound is kept as a bound. Ratios are combined by the geometric mean,
 * which treats before and after alike.
 *
 * @param value positive; above 1 after is slower
 * @param kind whether the value is the ratio or bounds it
 * @see <a href="https://doi.org/10.1145/5666.5673">Fleming &amp; Wallace (1986), How not to lie
 *     with statistics: the correct way to summarize benchmark results, CACM 29(3):218-221 (from
 *     memory)</a>
 */
public record TimeRatio(double value, Kind kind) {

  /** What the value says of the ratio. */
  public enum Kind {
    /** The ratio is the value. */
    EXACT,
    /** After hit its limit: the ratio is the value or more. */
    AT_LEAST,
    /** Before hit its limit: the ratio is the value or less. */
    AT_MOST
  }

  public TimeRatio {
    Objects.requireNonNull(kind, "kind");
    if (!(value > 0)) {
      throw new IllegalArgumentException("a ratio of times must be positive, was " + value);
    }
  }

  /**
   * The ratio of one pair.
   *
   * @param floorSeconds positive; shorter times count as this one, below which the clock tells
   *     nothing
   * @return empty if neither run answered
   */
  public static Optional<TimeRatio> of(SolveTime before, SolveTime after, double floorSeconds) {
    if (!(floorSeconds > 0)) {
      throw new IllegalArgumentException("the floor must be positive, was " + floorSeconds);
    }
    if (before.censored() && after.censored()) {
      return Optional.empty();
    }
    double value =
        Math.max(after.seconds(), floorSeconds) / Math.max(before.seconds(), floorSeconds);
    Kind kind = after.censored() ? Kind.AT_LEAST : before.censored() ? Kind.AT_MOST : Kind.EXACT;
    return Optional.of(new TimeRatio(value, kind));
  }

  /**
   * The geometric mean of the ratios of one instance's pairs: exact if all are, a bound if all
   * others bound it from one side.
   *
   * @return empty if there is no ratio, or if they are bounded from both sides
   */
  public static Optional<TimeRatio> mean(List<TimeRatio> pairs) {
    boolean below = pairs.stream().anyMatch(r -> r.kind == Kind.AT_LEAST);
    boolean above = pairs.stream().anyMatch(r -> r.kind == Kind.AT_MOST);
    if (pairs.isEmpty() || (below && above)) {
      return Optional.empty();
    }
    if (pairs.size() == 1) {
      return Optional.of(pairs.get(0)); // as it is, not by way of its logarithm
    }
    double logs = 0;
    for (TimeRatio pair : pairs) {
      logs += StrictMath.log(pair.value);
    }
    Kind kind = below ? Kind.AT_LEAST : above ? Kind.AT_MOST : Kind.EXACT;
    return Optional.of(new TimeRatio(StrictMath.exp(logs / pairs.size()), kind));
  }
}
