package steelyard.variants.model;

import java.util.Arrays;
import java.util.stream.IntStream;

/** An immutable row of ints with value equality. */
public final class Ints {
  private static final Ints EMPTY = new Ints(new int[0]);

  private final int[] values;

  private Ints(int[] values) {
    this.values = values;
  }

  /** The given values, copied. */
  public static Ints of(int... values) {
    return values.length == 0 ? EMPTY : new Ints(values.clone());
  }

  public int size() {
    return values.length;
  }

  public int get(int i) {
    return values[i];
  }

  public IntStream stream() {
    return Arrays.stream(values);
  }

  /** A fresh copy. */
  public int[] toArray() {
    return values.clone();
  }

  /** The rows of this at the positions in {@code order}, in that order. */
  public Ints permuted(int[] order) {
    int[] moved = new int[order.length];
    for (int i = 0; i < order.length; i++) {
      moved[i] = values[order[i]];
    }
    return new Ints(moved);
  }

  int compareRows(int i, int j) {
    return Integer.compare(values[i], values[j]);
  }

  /**
   * Makes sure that these are values of variables, none of them twice.
   *
   * @param what a name for one of them
   */
  void requireDistinctValues(String what) {
    stream().forEach(Domain::requireValue);
    if (stream().distinct().count() != values.length) {
      throw new IllegalArgumentException(what + " twice: " + this);
    }
  }

  /** Every variable id replaced by what {@code rewriting} makes of it. */
  Ints mapped(Rewriting rewriting) {
    int[] mapped = new int[values.length];
    for (int i = 0; i < mapped.length; i++) {
      mapped[i] = rewriting.variable(values[i]);
    }
    return new Ints(mapped);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Ints that && Arrays.equals(values, that.values);
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
