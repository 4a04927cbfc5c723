package steelyard.adapters.sat.encoding;

import java.util.Arrays;

/** A growing row of literals, without boxes. */
final class Literals {
  private int[] row;
  private int size;

  Literals() {
    this(8);
  }

  Literals(int capacity) {
    row = new int[Math.max(1, capacity)];
  }

  static Literals of(int... literals) {
    Literals list = new Literals(literals.length);
    for (int literal : literals) {
      list.add(literal);
    }
    return list;
  }

  void add(int literal) {
    if (size == row.length) {
      row = Arrays.copyOf(row, 2 * size);
    }
    row[size++] = literal;
  }

  int get(int i) {
    return row[i];
  }

  int size() {
    return size;
  }

  boolean isEmpty() {
    return size == 0;
  }

  /** The negative of each. */
  Literals negated() {
    Literals negated = new Literals(size);
    for (int i = 0; i < size; i++) {
      negated.add(-row[i]);
    }
    return negated;
  }

  Literals slice(int from, int to) {
    Literals part = new Literals(to - from);
    for (int i = from; i < to; i++) {
      part.add(row[i]);
    }
    return part;
  }
}
