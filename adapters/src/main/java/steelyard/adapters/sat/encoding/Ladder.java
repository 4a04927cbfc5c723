package steelyard.adapters.sat.encoding;

/**
 * A term of a sum: its possible values in ascending order, from 0, and for each the literal that
 * says the term is at least that.
 */
final class Ladder {
  private final long[] values;
  private final int[] literals;

  private Ladder(long[] values, int[] literals) {
    this.values = values;
    this.literals = literals;
  }

  /** {@code values[0]} is 0 and {@code literals[0]} is true; both are kept, not copied. */
  static Ladder of(long[] values, int[] literals) {
    return new Ladder(values, literals);
  }

  /** {@code coefficient·x} less its smallest value. */
  static Ladder of(Integers integers, int variable, long coefficient) {
    int size = integers.size(variable);
    long[] values = new long[size];
    int[] literals = new int[size];
    literals[0] = Cnf.TRUE;
    if (coefficient > 0) {
      long base = integers.valueAt(variable, 0);
      for (int i = 1; i < size; i++) {
        values[i] = coefficient * (integers.valueAt(variable, i) - base);
        literals[i] = integers.order(variable, i);
      }
    } else {
      long base = integers.valueAt(variable, size - 1);
      for (int i = 1; i < size; i++) {
        values[i] = coefficient * (integers.valueAt(variable, size - 1 - i) - base);
        literals[i] = -integers.order(variable, size - i);
      }
    }
    return new Ladder(values, literals);
  }

  /** {@code weight} where {@code literal} is true, else 0; the weight is positive. */
  static Ladder of(int literal, long weight) {
    return new Ladder(new long[] {0, weight}, new int[] {Cnf.TRUE, literal});
  }

  int size() {
    return values.length;
  }

  /** The values themselves; not to be changed. */
  long[] values() {
    return values;
  }

  long value(int i) {
    return values[i];
  }

  int literal(int i) {
    return literals[i];
  }

  /** The largest value. */
  long top() {
    return values[values.length - 1];
  }

  /** The literal that says the term is at most {@code value}, which is not negative. */
  int atMost(long value) {
    int above = floor(values, value) + 1;
    return above == values.length ? Cnf.TRUE : -literals[above];
  }

  /** What is missing to the largest value. */
  Ladder reversed() {
    int size = values.length;
    long[] missing = new long[size];
    int[] negated = new int[size];
    negated[0] = Cnf.TRUE;
    for (int i = 1; i < size; i++) {
      missing[i] = top() - values[size - 1 - i];
      negated[i] = -literals[size - i];
    }
    return new Ladder(missing, negated);
  }

  /** The position of the largest of {@code ascending} that is at most {@code value}; -1 if none. */
  static int floor(long[] ascending, long value) {
    int low = -1;
    int high = ascending.length - 1;
    while (low < high) {
      int middle = (low + high + 1) >> 1;
      if (ascending[middle] <= value) {
        low = middle;
      } else {
        high = middle - 1;
      }
    }
    return low;
  }
}
