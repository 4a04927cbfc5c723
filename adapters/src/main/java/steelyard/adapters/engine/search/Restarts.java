package steelyard.adapters.engine.search;

/**
 * After how many conflicts the search starts again from the root.
 *
 * <p>The cutoffs of both policies grow without bound, so a search with restarts still ends.
 */
public final class Restarts {
  private enum Policy {
    NEVER,
    LUBY,
    GEOMETRIC
  }

  private final Policy policy;
  private final long scale;
  private final double factor;
  private long next;
  private double length;

  private Restarts(Policy policy, long scale, double factor) {
    this.policy = policy;
    this.scale = scale;
    this.factor = factor;
    length = scale;
  }

  /** One run to the end. */
  public static Restarts never() {
    return new Restarts(Policy.NEVER, 1, 1);
  }

  /**
   * {@code scale} times 1 1 2 1 1 2 4 ...: Luby, Sinclair and Zuckerman (1993), Optimal speedup of
   * Las Vegas algorithms, Information Processing Letters 47:173-180.
   */
  public static Restarts luby(long scale) {
    if (scale < 1) {
      throw new IllegalArgumentException("restart scale " + scale + " is below 1");
    }
    return new Restarts(Policy.LUBY, scale, 1);
  }

  /**
   * {@code first}, then each cutoff {@code factor} times the last: Walsh (1999), Search in a small
   * world, IJCAI.
   */
  public static Restarts geometric(long first, double factor) {
    if (first < 1 || !(factor > 1)) {
      throw new IllegalArgumentException(
          "geometric restarts need a first cutoff of at least 1 and a factor above 1");
    }
    return new Restarts(Policy.GEOMETRIC, first, factor);
  }

  /** The number of conflicts that the next run may have. */
  public long nextCutoff() {
    return switch (policy) {
      case NEVER -> Long.MAX_VALUE;
      case LUBY -> scale * term(++next);
      case GEOMETRIC -> {
        long cutoff = (long) length;
        length = Math.min(length * factor, Long.MAX_VALUE / 2.0);
        yield cutoff;
      }
    };
  }

  /** Term i ≥ 1 of the sequence 1 1 2 1 1 2 4 1 1 2 1 1 2 4 8 ... */
  static long term(long i) {
    long rest = i;
    while (true) {
      long whole = 2 * Long.highestOneBit(rest) - 1;
      if (rest == whole) {
        return (whole + 1) / 2;
      }
      rest -= whole / 2;
    }
  }
}
