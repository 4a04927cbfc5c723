package steelyard.variants.family;

import java.util.SortedMap;

/**
 * A family that describes its instances by numbers, so that a reader of results can ask on which
 * kind of instance a change helps. Without this, instances are described by the sizes of their
 * models alone.
 *
 * <pre>{@code
 * public SortedMap<String, Double> features(Roster roster) {
 *   return new TreeMap<>(Map.of(
 *       "nurses", (double) roster.nurses().size(),
 *       "demand-share", roster.demandedHours() / (double) roster.contractedHours()));
 * }
 * }</pre>
 *
 * @param <I> the family's instances
 */
public interface Featured<I> extends Family<I> {
  /**
   * Numbers that say what is particular about the instance. Look at the data, solve nothing: this
   * is asked of every instance before a sweep begins.
   *
   * @return finite values by name (lower case, digits and hyphens); the same names on every
   *     instance, equal values on equal instances
   */
  SortedMap<String, Double> features(I instance);
}
