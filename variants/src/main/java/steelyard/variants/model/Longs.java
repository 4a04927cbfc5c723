package steelyard.variants.model;

import java.util.Arrays;
import java.util.stream.LongStream;

/** An immutable row of longs with value equality. */
public final class Longs {
  private static final Longs EMPTY = new Longs(new long[0]);

  private final long[] values;

  private Longs(long[] values) {
    this.values = values;
  }

  /** The given values, copied. */
  public static Longs of(long... values) {
    return values.length == 0 ? EMPTY : new Longs(values.clone());
  }

  public int size() {
    return values.length;
  }

  public long get(int i) {
    return values[i];
  }

  public LongStream stream() {
    return Arrays.stream(values);
  }

  /** A fresh copy. */
  public long[] toArray() {
    return values.clone();
  }

  /** The rows of this at the positions in {@code order}, in that order. */
  public Longs permuted(int[] order) {
    long[] moved = new long[order.length];
    for (int i = 0; i < order.length; i++) {
      moved[i] = values[order[i]];
    }
    return new Longs(moved);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Longs that && Arrays.equals(values, that.values);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(values);
  }

  @Override
  public String toString() {
    return Arrays.toString(values);
  }
}
