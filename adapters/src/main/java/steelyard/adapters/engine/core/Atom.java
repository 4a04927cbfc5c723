package steelyard.adapters.engine.core;

/**
 * The one literal of the engine, {@code [h ≥ k]}, {@code [x = k]} or {@code [x ≠ k]}, packed into a
 * long: the code in the upper half, k in the lower.
 *
 * <p>The code of {@code [h ≥ k]} is {@code 2h}; {@code [h ≤ k]} is {@code [h^1 ≥ -k]}. The codes of
 * {@code [x = k]} and {@code [x ≠ k]} are {@code 4v + 1} and {@code 4v + 3}, v being the variable.
 * Negation flips bit 1 of the code and, for bounds, turns k into {@code 1 - k}.
 */
public final class Atom {
  /** {@code [zero ≥ 0]}: always true. */
  public static final long TRUE = ge(Store.ZERO, 0);

  /** Always false. */
  public static final long FALSE = not(TRUE);

  private static final long VALUE = 0xFFFF_FFFFL;

  private Atom() {}

  /** {@code [h ≥ k]}. */
  public static long ge(int h, int k) {
    return ((long) h << 33) | (k & VALUE);
  }

  /** {@code [h ≤ k]}. */
  public static long le(int h, int k) {
    return ge(h ^ 1, -k);
  }

  /** {@code [h = k]}. */
  public static long eq(int h, int k) {
    return ((((long) h & ~1L) << 1 | 1) << 32) | (signed(h, k) & VALUE);
  }

  /** {@code [h ≠ k]}. */
  public static long ne(int h, int k) {
    return ((((long) h & ~1L) << 1 | 3) << 32) | (signed(h, k) & VALUE);
  }

  /** The atom that is true exactly where {@code atom} is false. */
  public static long not(long atom) {
    int k = isBound(atom) ? 1 - value(atom) : value(atom);
    return ((atom ^ (2L << 32)) & ~VALUE) | (k & VALUE);
  }

  /** Whether the atom is {@code [h ≥ k]} for its {@link #handle}. */
  public static boolean isBound(long atom) {
    return (atom & (1L << 32)) == 0;
  }

  /** Whether the atom is {@code [x ≠ k]}. */
  public static boolean isUnequal(long atom) {
    return (atom & (3L << 32)) == 3L << 32;
  }

  /** The handle h of a bound {@code [h ≥ k]}; for the other atoms the variable's own handle. */
  public static int handle(long atom) {
    int code = (int) (atom >>> 32);
    return (code & 1) == 0 ? code >>> 1 : code >>> 2 << 1;
  }

  /** The variable that the atom speaks of. */
  public static int variable(long atom) {
    return (int) (atom >>> 34);
  }

  /** The threshold k of a bound (of the handle), or the value k (of the variable). */
  public static int value(long atom) {
    return (int) atom;
  }

  /** The atom in words, such as {@code [x3 ≥ 5]} or {@code [-x3 ≥ -7]}. */
  public static String show(long atom) {
    String name = (handle(atom) & 1) == 0 ? "x" : "-x";
    String sign = isBound(atom) ? " ≥ " : isUnequal(atom) ? " ≠ " : " = ";
    return "[" + name + variable(atom) + sign + value(atom) + "]";
  }

  private static int signed(int h, int k) {
    return (h & 1) == 0 ? k : -k;
  }
}
