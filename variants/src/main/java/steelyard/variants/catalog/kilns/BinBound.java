package steelyard.variants.catalog.kilns;

import java.util.stream.IntStream;

/**
 * How many bins of one capacity given items need at least: the bound L2. For each threshold a of at
 * most half the capacity C, items larger than C - a and items larger than C/2 have bins of their
 * own, and what of the items from a to C/2 does not fit beside the latter needs more. Cost: O(C·n).
 *
 * @see <a href="https://doi.org/10.1016/0166-218X(90)90094-S">Martello &amp; Toth (1990), "Lower
 *     bounds and reduction procedures for the bin packing problem", DAM 28(1):59-70</a>
 */
final class BinBound {
  private BinBound() {}

  /**
   * The bound; 0 for no items.
   *
   * @param sizes each from 1 to {@code capacity}
   */
  static int of(int[] sizes, int capacity) {
    int most = 0;
    for (int threshold = 0; threshold <= capacity / 2; threshold++) {
      most = Math.max(most, above(threshold, sizes, capacity));
    }
    return most;
  }

  private static int above(int threshold, int[] sizes, int capacity) {
    int alone = (int) IntStream.of(sizes).filter(s -> s > capacity - threshold).count();
    int[] large =
        IntStream.of(sizes).filter(s -> 2 * s > capacity && s <= capacity - threshold).toArray();
    int small = IntStream.of(sizes).filter(s -> s >= threshold && 2 * s <= capacity).sum();
    int beside = large.length * capacity - IntStream.of(large).sum();
    int rest = Math.max(0, small - beside);
    return alone + large.length + (capacity == 0 ? 0 : (rest + capacity - 1) / capacity);
  }
}
