package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * Rows handle + offset, flat in two arrays: what a constraint speaks of. Row i's value is the
 * handle's value plus the offset; a constant is {@link Store#ZERO} with an offset.
 *
 * <p>Offsets and the values of every row are at most {@link Store#LIMIT} in magnitude, so bounds
 * passed between rows fit an int.
 */
public final class Scope {
  private static final Scope EMPTY = new Scope(new int[0], new int[0]);

  private final int[] handle;
  private final int[] offset;

  private Scope(int[] handle, int[] offset) {
    this.handle = handle;
    this.offset = offset;
  }

  /** The scope without rows. */
  public static Scope empty() {
    return EMPTY;
  }

  /** The rows h + 0. */
  public static Scope of(int... handles) {
    return new Scope(handles.clone(), new int[handles.length]);
  }

  /** The rows {@code handles[i] + offsets[i]}, checked against the domains in {@code s}. */
  public static Scope of(Store s, int[] handles, int[] offsets) {
    if (handles.length != offsets.length) {
      throw new IllegalArgumentException(
          handles.length + " handles, " + offsets.length + " offsets");
    }
    for (int i = 0; i < handles.length; i++) {
      long least = (long) s.min(handles[i]) + offsets[i];
      long greatest = (long) s.max(handles[i]) + offsets[i];
      if (Math.abs((long) offsets[i]) > Store.LIMIT
          || least < -Store.LIMIT
          || greatest > Store.LIMIT) {
        throw new IllegalArgumentException(
            "row " + i + " has values " + least + ".." + greatest + ", beyond 10^9");
      }
    }
    return new Scope(handles.clone(), offsets.clone());
  }

  /** The rows -(handle + offset): the mirror image. */
  public Scope negated() {
    int[] h = handle.clone();
    int[] o = offset.clone();
    for (int i = 0; i < h.length; i++) {
      h[i] ^= 1;
      o[i] = -o[i];
    }
    return new Scope(h, o);
  }

  /** These rows and then the rows of {@code more}. */
  public Scope and(Scope more) {
    int n = size();
    int[] h = Arrays.copyOf(handle, n + more.size());
    int[] o = Arrays.copyOf(offset, n + more.size());
    System.arraycopy(more.handle, 0, h, n, more.size());
    System.arraycopy(more.offset, 0, o, n, more.size());
    return new Scope(h, o);
  }

  /** Rows {@code from} to {@code to} (exclusive). */
  public Scope rows(int from, int to) {
    return new Scope(Arrays.copyOfRange(handle, from, to), Arrays.copyOfRange(offset, from, to));
  }

  /** Number of rows. */
  public int size() {
    return handle.length;
  }

  /** Handle of row i. */
  public int handle(int i) {
    return handle[i];
  }

  /** Offset of row i. */
  public int offset(int i) {
    return offset[i];
  }

  /** Least value of row i. */
  public int min(Store s, int i) {
    return s.min(handle[i]) + offset[i];
  }

  /** Greatest value of row i. */
  public int max(Store s, int i) {
    return s.max(handle[i]) + offset[i];
  }

  /** Whether row i has one value left. */
  public boolean fixed(Store s, int i) {
    return s.fixed(handle[i]);
  }

  /** Whether row i can be {@code v}. */
  public boolean has(Store s, int i, int v) {
    return s.has(handle[i], v - offset[i]);
  }

  /** Least value of row i that is at least {@code v}, which must not pass its maximum. */
  public int next(Store s, int i, int v) {
    return s.next(handle[i], v - offset[i]) + offset[i];
  }

  /** Requires row i ≥ v. */
  public boolean setMin(Store s, int i, int v, int why) {
    return s.setMin(handle[i], v - offset[i], why);
  }

  /** Requires row i ≤ v. */
  public boolean setMax(Store s, int i, int v, int why) {
    return s.setMax(handle[i], v - offset[i], why);
  }

  /** Requires row i = v. */
  public boolean assign(Store s, int i, int v, int why) {
    return s.assign(handle[i], v - offset[i], why);
  }

  /** Requires row i ≠ v. */
  public boolean remove(Store s, int i, int v, int why) {
    return s.remove(handle[i], v - offset[i], why);
  }

  /** {@code [row i ≥ v]}. */
  public long ge(int i, int v) {
    return Atom.ge(handle[i], v - offset[i]);
  }

  /** {@code [row i ≤ v]}. */
  public long le(int i, int v) {
    return Atom.le(handle[i], v - offset[i]);
  }

  /** {@code [row i = v]}. */
  public long eq(int i, int v) {
    return Atom.eq(handle[i], v - offset[i]);
  }

  /** {@code [row i ≠ v]}. */
  public long ne(int i, int v) {
    return Atom.ne(handle[i], v - offset[i]);
  }

  /** The v for which {@code atom} is {@link #ge ge(i, v)}. */
  public int lower(int i, long atom) {
    return Atom.value(atom) + offset[i];
  }

  /** The v for which {@code atom} is {@link #le le(i, v)}. */
  public int upper(int i, long atom) {
    return offset[i] - Atom.value(atom);
  }
}
