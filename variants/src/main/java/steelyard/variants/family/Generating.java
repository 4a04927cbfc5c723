package steelyard.variants.family;

/**
 * A family that makes up small instances: what is claimed of an amendment can then be checked on
 * more of them than anyone collects, and on small enough ones to try every solution.
 *
 * @param <I> the family's instances
 */
public interface Generating<I> extends Family<I> {
  /**
   * The text of an instance file, which {@link #read} accepts. Give every part of the model a
   * chance to matter on some seed. Instances without a solution are welcome now and then; so are
   * odd ones (nothing to do, everything alike).
   *
   * @param seed any number; equal seeds give equal texts, on every machine: draw from a generator
   *     that is made from it, such as {@link java.util.SplittableRandom}
   * @return an instance of at most a few dozen decisions
   */
  String generate(long seed);
}
