package steelyard.adapters.program;

import java.util.Arrays;

/** What a program says of each variable: true, false or nothing. */
final class Assignment {
  private static final byte TRUE = 1;
  private static final byte FALSE = -1;

  /** By variable; 0 where nothing was said. */
  private final byte[] values;

  Assignment(int variables) {
    values = new byte[variables + 1];
  }

  /** Sets a literal true; false if it was said to be false before. */
  boolean put(int literal) {
    int variable = Math.abs(literal);
    byte value = literal > 0 ? TRUE : FALSE;
    boolean agrees = values[variable] != -value;
    values[variable] = value;
    return agrees;
  }

  /** Whether the literal was said to be true. */
  boolean makesTrue(int literal) {
    return values[Math.abs(literal)] == (literal > 0 ? TRUE : FALSE);
  }

  /** By variable; what nothing was said of is false, which changes no clause that is true. */
  boolean[] completed() {
    boolean[] truth = new boolean[values.length];
    for (int v = 1; v < values.length; v++) {
      truth[v] = values[v] == TRUE;
    }
    return truth;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Assignment that && Arrays.equals(values, that.values);
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
