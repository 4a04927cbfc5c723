package steelyard.variants.model;

import java.util.Arrays;
import java.util.Collection;

/**
 * An immutable table of rows of one arity, with value equality. An entry {@link #ANY} stands for
 * every value: the row is a short tuple.
 */
public final class Tuples {
  /** Every value of the column's domain. */
  public static final int ANY = Integer.MAX_VALUE;

  private final int arity;
  private final int size;
  private final int[] flat;

  private Tuples(int arity, int size, int[] flat) {
    this.arity = arity;
    this.size = size;
    this.flat = flat;
  }

  /**
   * A table of the given rows, copied.
   *
   * @throws IllegalArgumentException if a row has another length than {@code arity}, or an entry is
   *     neither a value nor {@link #ANY}
   */
  public static Tuples of(int arity, Collection<int[]> rows) {
    int[] flat = new int[Math.multiplyExact(arity, rows.size())];
    int at = 0;
    for (int[] row : rows) {
      if (row.length != arity) {
        throw new IllegalArgumentException(
            "a row of " + row.length + " values in a table of " + arity + " columns");
      }
      for (int value : row) {
        if (value != ANY) {
          Domain.requireValue(value);
        }
        flat[at++] = value;
      }
    }
    return new Tuples(arity, rows.size(), flat);
  }

  public static Tuples of(int arity, int[]... rows) {
    return of(arity, Arrays.asList(rows));
  }

  public int arity() {
    return arity;
  }

  public int size() {
    return size;
  }

  public int get(int row, int column) {
    return flat[row * arity + column];
  }

  /** Whether the row has an entry {@link #ANY}. */
  public boolean isShort(int row) {
    for (int c = 0; c < arity; c++) {
      if (get(row, c) == ANY) {
        return true;
      }
    }
    return false;
  }

  /** The rows of this at the positions in {@code order}, in that order. */
  public Tuples permuted(int[] order) {
    int[] moved = new int[order.length * arity];
    for (int i = 0; i < order.length; i++) {
      System.arraycopy(flat, order[i] * arity, moved, i * arity, arity);
    }
    return new Tuples(arity, order.length, moved);
  }

  int compareRows(int i, int j) {
    return Arrays.compare(flat, i * arity, (i + 1) * arity, flat, j * arity, (j + 1) * arity);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Tuples that
        && arity == that.arity
        && size == that.size
        && Arrays.equals(flat, that.flat);
  }

  @Override
  public int hashCode() {
    return 31 * (31 * arity + size) + Arrays.hashCode(flat);
  }

  @Override
  public String toString() {
    return size + " rows of " + arity;
  }
}
