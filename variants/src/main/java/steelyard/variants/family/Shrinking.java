package steelyard.variants.family;

import java.util.stream.Stream;

/**
 * A family that can make an instance smaller: where something goes wrong on a large instance, the
 * smallest one on which it still does says why.
 *
 * <p>Whoever looks for it tries the instances in order, goes on from the first on which the fault
 * is still there, and stops where there is none.
 *
 * @param <I> the family's instances
 */
public interface Shrinking<I> extends Family<I> {
  /**
   * Texts of instance files, each a smaller version of {@code instance} that {@link #read} accepts:
   * with half of the orders, without one machine, with a day less. They need not have solutions.
   *
   * @return the boldest step first; each is smaller by a measure of the family's own that cannot
   *     fall for ever, so that going on from any of them ends; none if nothing can be left out
   */
  Stream<String> shrink(I instance);
}
