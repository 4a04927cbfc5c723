package steelyard.variants.family;

import java.util.SortedMap;

/**
 * A family that knows what an earlier plan is worth today: a service that plans every day starts
 * from yesterday's plan, and what is weighed should too.
 *
 * @param <I> the family's instances
 */
public interface Hinting<I> extends Family<I> {
  /**
   * What of the plan for {@code before} to try first on {@code now}: what is done by now is gone,
   * days have moved, some orders are new. It may be wrong; solvers are free to ignore it.
   *
   * @param before the earlier instance
   * @param plan an answer to it, checked
   * @param now the instance to be solved
   * @return values of decisions of the plain model of {@code now}, by name, each in its domain;
   *     those that the plan says nothing of are left out
   */
  SortedMap<String, Integer> hint(I before, Answer plan, I now);
}
