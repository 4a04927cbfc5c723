package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class BinBoundTest {
  /**
   * At least the total over the capacity, at most an optimum (Martello and Toth 1990, section 3).
   */
  @Test
  void lies_between_the_continuous_bound_and_the_optimum() {
    SplittableRandom random = new SplittableRandom(11);
    int above = 0;
    int below = 0;
    for (int i = 0; i < 300; i++) {
      int capacity = random.nextInt(3, 12);
      int[] sizes = random.ints(random.nextInt(1, 8), 1, capacity + 1).toArray();
      int bound = BinBound.of(sizes, capacity);
      int continuous = (IntStream.of(sizes).sum() + capacity - 1) / capacity;
      int optimum = bins(sizes, capacity);
      assertThat(bound).isBetween(continuous, optimum);
      above += bound > continuous ? 1 : 0;
      below += bound < optimum ? 1 : 0;
    }
    assertThat(above).isPositive();
    assertThat(below).isLessThan(above);
  }

  @Test
  void needs_no_bin_for_nothing_and_one_for_each_item_above_half() {
    assertThat(BinBound.of(new int[0], 7)).isZero();
    assertThat(BinBound.of(new int[0], 0)).isZero();
    assertThat(BinBound.of(new int[] {4, 4, 4, 5}, 7)).isEqualTo(4);
  }

  /** The fewest bins, by trying every one for every item. */
  private static int bins(int[] sizes, int capacity) {
    return fewest(sizes, 0, new int[sizes.length], capacity);
  }

  private static int fewest(int[] sizes, int item, int[] loads, int capacity) {
    if (item == sizes.length) {
      return (int) IntStream.of(loads).filter(load -> load > 0).count();
    }
    int fewest = Integer.MAX_VALUE;
    for (int bin = 0; bin <= item; bin++) {
      if (loads[bin] + sizes[item] <= capacity) {
        loads[bin] += sizes[item];
        fewest = Math.min(fewest, fewest(sizes, item + 1, loads, capacity));
        loads[bin] -= sizes[item];
      }
    }
    return fewest;
  }
}
