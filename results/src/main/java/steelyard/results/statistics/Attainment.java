package steelyard.results.statistics;

import java.util.Objects;
import java.util.OptionalDouble;
import java.util.OptionalLong;

/**
 * What one run attained, as far as another run on the same instance can be compared with it.
 *
 * @param proved the goal was answered, usably: optimality or infeasibility, or a solved
 *     satisfaction problem
 * @param answered a usable solution, or a usable proof that there is none
 * @param cost the best usable solution's objective, turned so that less is better; empty without
 * @param seconds the time to the end of the run; empty where time is not what was limited
 */
public record Attainment(
    boolean proved, boolean answered, OptionalLong cost, OptionalDouble seconds) {

  public Attainment {
    Objects.requireNonNull(cost, "cost");
    Objects.requireNonNull(seconds, "seconds");
    if (proved && !answered) {
      throw new IllegalArgumentException("a proved run has an answer");
    }
    if (cost.isPresent() && !answered) {
      throw new IllegalArgumentException("a run with a usable objective has an answer");
    }
  }
}
