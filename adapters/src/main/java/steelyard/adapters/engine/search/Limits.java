package steelyard.adapters.engine.search;

/**
 * How much work a search may do; each limit ends it after exactly that much.
 *
 * @param nodes decisions
 * @param failures conflicts
 * @param solutions solutions found
 */
public record Limits(long nodes, long failures, long solutions) {
  /** No limit on anything. */
  public static final Limits NONE = new Limits(Long.MAX_VALUE, Long.MAX_VALUE, Long.MAX_VALUE);

  /** Refuses negative limits. */
  public Limits {
    if (nodes < 0 || failures < 0 || solutions < 0) {
      throw new IllegalArgumentException("a limit is negative");
    }
  }

  /** The same but for the number of decisions. */
  public Limits withNodes(long most) {
    return new Limits(most, failures, solutions);
  }

  /** The same but for the number of conflicts. */
  public Limits withFailures(long most) {
    return new Limits(nodes, most, solutions);
  }

  /** The same but for the number of solutions. */
  public Limits withSolutions(long most) {
    return new Limits(nodes, failures, most);
  }
}
