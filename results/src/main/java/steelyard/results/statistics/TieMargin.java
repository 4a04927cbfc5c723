package steelyard.results.statistics;

/**
 * Within what distance are two times the same for practical purposes?
 *
 * <p>Two times tie if they differ by at most the larger of an absolute distance and a share of the
 * shorter one: the first covers timer and start-up noise, the second everyday variation (common
 * practice).
 *
 * @param relative a share, at least 0: 0.05 is five per cent
 * @param absoluteSeconds at least 0
 */
public record TieMargin(double relative, double absoluteSeconds) {

  public TieMargin {
    if (!(relative >= 0) || !(absoluteSeconds >= 0)) {
      throw new IllegalArgumentException(
          "a tie margin must be at least 0, was " + relative + " and " + absoluteSeconds + " s");
    }
  }

  /** Whether two times, in seconds, are too close to call. */
  public boolean ties(double a, double b) {
    return Math.abs(a - b) <= Math.max(absoluteSeconds, relative * Math.min(a, b));
  }
}
