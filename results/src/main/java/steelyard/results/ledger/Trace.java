package steelyard.results.ledger;

import java.util.List;
import java.util.OptionalLong;

/**
 * What a run reported on its way, in order.
 *
 * @param solutionCount how many improving solutions there were
 * @param solutions those that were kept: all, or the first, some and the last
 * @param boundCount how many bounds there were
 * @param bounds those that were kept: all, or the first, some and the last
 */
public record Trace(
    long solutionCount, List<Solution> solutions, long boundCount, List<Bound> bounds) {

  /**
   * One improving solution.
   *
   * @param nanos after the limit's clock started
   * @param objective its exact objective; empty for a satisfaction problem
   * @param decisions its decision values
   */
  public record Solution(long nanos, OptionalLong objective, Decisions decisions) {
    public Solution {
      Text.require("solution objective", objective);
      Text.require("decisions", decisions);
    }
  }

  /**
   * One proved bound on the objective.
   *
   * @param nanos after the limit's clock started
   * @param value the bound
   */
  public record Bound(long nanos, long value) {}

  public Trace {
    solutions = List.copyOf(Text.require("solutions", solutions));
    bounds = List.copyOf(Text.require("bounds", bounds));
    if (solutionCount < solutions.size() || boundCount < bounds.size()) {
      throw new IllegalArgumentException(
          "counts of %d solutions and %d bounds are below the %d and %d kept"
              .formatted(solutionCount, boundCount, solutions.size(), bounds.size()));
    }
  }

  /** The trace of a run that reported nothing. */
  public static Trace empty() {
    return new Trace(0, List.of(), 0, List.of());
  }
}
