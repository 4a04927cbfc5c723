package steelyard.results.statistics;

/**
 * How long a run took to answer its goal: exactly, or more than could be watched.
 *
 * @param seconds finite, at least 0; of a censored run the limit under which it was watched,
 *     whenever it ended (a crash after a second tells nothing about the time to an answer)
 * @param censored true if no usable answer came within the limit
 */
public record SolveTime(double seconds, boolean censored) {

  public SolveTime {
    if (!(seconds >= 0 && Double.isFinite(seconds))) {
      throw new IllegalArgumentException("seconds must be finite and at least 0, was " + seconds);
    }
  }

  /** A run that answered after so many seconds. */
  public static SolveTime exactly(double seconds) {
    return new SolveTime(seconds, false);
  }

  /** A run that had not answered when its limit ended it. */
  public static SolveTime beyond(double limitSeconds) {
    return new SolveTime(limitSeconds, true);
  }
}
