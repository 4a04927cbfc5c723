package steelyard.variants.model;

import java.util.Arrays;
import java.util.stream.IntStream;

/**
 * A finite, non-empty set of ints as sorted, disjoint, non-adjacent ranges, with value equality.
 */
public final class Domain {
  /** The largest magnitude of a value: negatives, predecessors and differences fit an int. */
  public static final int LIMIT = 1_000_000_000;

  /** The domain 0..1. */
  public static final Domain BOOLEAN = new Domain(new int[] {0, 1});

  /** Two ints a range: from, to. */
  private final int[] bounds;

  private Domain(int[] bounds) {
    this.bounds = bounds;
  }

  /**
   * All values from {@code min} to {@code max}.
   *
   * @throws IllegalArgumentException if it is empty or a value is beyond {@link #LIMIT}
   */
  public static Domain between(int min, int max) {
    if (min > max) {
      throw new IllegalArgumentException("empty domain " + min + ".." + max);
    }
    requireValue(min);
    requireValue(max);
    return new Domain(new int[] {min, max});
  }

  /** The given values, in any order, repeated or not. */
  public static Domain of(int... values) {
    return of(IntStream.of(values));
  }

  /** The given values, in any order, repeated or not. */
  public static Domain of(IntStream values) {
    int[] sorted = values.sorted().distinct().toArray();
    if (sorted.length == 0) {
      throw new IllegalArgumentException("empty domain");
    }
    requireValue(sorted[0]);
    requireValue(sorted[sorted.length - 1]);
    int[] bounds = new int[2 * sorted.length];
    int ends = 0;
    for (int value : sorted) {
      if (ends > 0 && bounds[ends - 1] == value - 1) {
        bounds[ends - 1] = value;
      } else {
        bounds[ends++] = value;
        bounds[ends++] = value;
      }
    }
    return new Domain(Arrays.copyOf(bounds, ends));
  }

  /**
   * The union of ranges.
   *
   * @param bounds from, to, from, to, ...; ascending, disjoint; adjacent ranges are joined
   */
  public static Domain ofRanges(int... bounds) {
    if (bounds.length == 0 || bounds.length % 2 != 0) {
      throw new IllegalArgumentException("ranges come as pairs, at least one");
    }
    int[] joined = new int[bounds.length];
    int ends = 0;
    for (int i = 0; i < bounds.length; i += 2) {
      if (bounds[i] > bounds[i + 1] || (ends > 0 && bounds[i] <= joined[ends - 1])) {
        throw new IllegalArgumentException("ranges must ascend: " + Arrays.toString(bounds));
      }
      if (ends > 0 && joined[ends - 1] == bounds[i] - 1) {
        joined[ends - 1] = bounds[i + 1];
      } else {
        joined[ends++] = bounds[i];
        joined[ends++] = bounds[i + 1];
      }
    }
    requireValue(joined[0]);
    requireValue(joined[ends - 1]);
    return new Domain(Arrays.copyOf(joined, ends));
  }

  static void requireValue(long value) {
    if (value > LIMIT || value < -LIMIT) {
      throw new IllegalArgumentException(
          "value " + value + " is beyond what a variable can take (at most 10^9 in magnitude)");
    }
  }

  public int min() {
    return bounds[0];
  }

  public int max() {
    return bounds[bounds.length - 1];
  }

  /** How many values it has. */
  public long size() {
    long size = 0;
    for (int r = 0; r < ranges(); r++) {
      size += (long) to(r) - from(r) + 1;
    }
    return size;
  }

  /** How many ranges it has, at least 1. */
  public int ranges() {
    return bounds.length / 2;
  }

  public int from(int range) {
    return bounds[2 * range];
  }

  public int to(int range) {
    return bounds[2 * range + 1];
  }

  public boolean isInterval() {
    return bounds.length == 2;
  }

  public boolean isFixed() {
    return min() == max();
  }

  public boolean contains(long value) {
    int low = 0;
    int high = ranges() - 1;
    while (low <= high) {
      int middle = (low + high) >>> 1;
      if (value < from(middle)) {
        high = middle - 1;
      } else if (value > to(middle)) {
        low = middle + 1;
      } else {
        return true;
      }
    }
    return false;
  }

  /** Its values, ascending. */
  public IntStream stream() {
    return IntStream.range(0, ranges()).flatMap(r -> IntStream.rangeClosed(from(r), to(r)));
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Domain that && Arrays.equals(bounds, that.bounds);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(bounds);
  }

  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    for (int r = 0; r < ranges(); r++) {
      text.append(r == 0 ? "" : " ").append(from(r));
      if (to(r) != from(r)) {
        text.append("..").append(to(r));
      }
    }
    return text.toString();
  }
}
