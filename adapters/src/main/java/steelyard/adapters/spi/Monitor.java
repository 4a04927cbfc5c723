package steelyard.adapters.spi;

import steelyard.variants.model.Longs;

/** Hears what a backend does. Calls come one at a time. */
public interface Monitor {
  /** A phase of the backend's own begins, such as {@code presolve}. */
  void phase(String name);

  /**
   * A solution; the objective is recomputed from it by the caller.
   *
   * @param decisions values in the order of {@code model.variables().decisions()}; not kept
   */
  void solution(int[] decisions);

  /** The objective is proved not to be better than {@code value}. */
  void bound(long value);

  /** A counter's final value; a counter does not depend on the machine's speed. */
  void count(String counter, long value);

  /** A measure by posting id, such as failures. */
  void blame(String measure, Longs byPosting);
}
