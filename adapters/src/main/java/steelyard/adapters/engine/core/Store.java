package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * The domains of all variables, on a trail.
 *
 * <p>Reading and narrowing go through handles: {@code 2v} is x and {@code 2v + 1} is -x, so that
 * {@code max(h) == -min(h ^ 1)} and negating a handle is flipping its last bit. Narrowing returns
 * false on conflict; after that only {@link #popTo} makes sense. Values are at most {@link #LIMIT}
 * in magnitude. Not safe for use by several threads.
 *
 * <p>A domain is its two bounds, which are always members, and the holes between them (see {@link
 * Holes}).
 */
public final class Store {
  /** Greatest magnitude of a value. */
  public static final int LIMIT = 1_000_000_000;

  /** Handle of the constant 0; with an offset it is any constant. */
  public static final int ZERO = 0;

  /** Makers of changes that are no propagator. */
  static final int DECISION = -1;

  static final int OWN = -2;
  static final int CLAUSE = -3;
  static final int ARC = -4;

  private static final int NO_END = -1;

  /** The index of the propagator that is running, or one of the makers above. */
  int running = DECISION;

  final Trail trail;
  final Holes holes;
  final Agenda agenda = new Agenda();
  private final Cells cells = new Cells();
  private int variables;
  private int[] lo = new int[64];
  private int[] stamp = new int[64];
  private int[] last = new int[64];
  private int magic = 1;
  private int level;
  private int failedBy;
  private long failedAtom;
  private int failedWhy;

  /** A store that does not record reasons. */
  public Store() {
    this(false);
  }

  /** A store that records who made each change and why, if {@code learning}. */
  public Store(boolean learning) {
    trail = new Trail(learning);
    holes = new Holes(learning);
    variable(0, 0);
  }

  /** Makes a variable with the values {@code min..max} and returns its handle. */
  public int variable(int min, int max) {
    if (min > max || min < -LIMIT || max > LIMIT) {
      throw new IllegalArgumentException("domain " + min + ".." + max + " is empty or beyond 10^9");
    }
    if (agenda.frozen()) {
      throw new IllegalStateException("variables are made before the first propagation");
    }
    int h = 2 * variables;
    if (h == lo.length) {
      lo = Arrays.copyOf(lo, 2 * h);
      stamp = Arrays.copyOf(stamp, 2 * h);
      last = Arrays.copyOf(last, 2 * h);
    }
    lo[h] = min;
    lo[h + 1] = -max;
    last[h] = -1;
    last[h + 1] = -1;
    holes.variable(variables, min, max);
    variables++;
    return h;
  }

  /** Number of variables, the constant 0 included as variable 0. */
  public int variables() {
    return variables;
  }

  /** Whether reasons are recorded. */
  public boolean learning() {
    return trail.learning;
  }

  /** Least value of h. */
  public int min(int h) {
    return lo[h];
  }

  /** Greatest value of h. */
  public int max(int h) {
    return -lo[h ^ 1];
  }

  /** Whether one value is left. */
  public boolean fixed(int h) {
    return lo[h] == -lo[h ^ 1];
  }

  /** Whether {@code value} is in the domain of h. */
  public boolean has(int h, int value) {
    if (value < lo[h] || value > -lo[h ^ 1]) {
      return false;
    }
    return !holes.has(h >> 1, (h & 1) == 0 ? value : -value);
  }

  /**
   * Number of values of h. Holes of a variable created with more than 4096 values are not
   * subtracted.
   */
  public int size(int h) {
    int x = h & ~1;
    return holes.any(h >> 1) ? holes.size(h >> 1, lo[x], -lo[x + 1]) : max(h) - lo[h] + 1;
  }

  /** Whether h may have holes between its bounds; a hint, true may turn out to be none. */
  public boolean mayHaveHoles(int h) {
    return holes.any(h >> 1);
  }

  /** Least value of h that is at least {@code value}, which must not pass {@code max(h)}. */
  public int next(int h, int value) {
    if (value <= lo[h]) {
      return lo[h];
    }
    if (!holes.any(h >> 1)) {
      return value;
    }
    return (h & 1) == 0 ? holes.next(h >> 1, value) : -holes.previous(h >> 1, -value);
  }

  /** 1 if the atom is true, -1 if it is false, 0 if that is open. */
  public int truth(long atom) {
    int h = Atom.handle(atom);
    int k = Atom.value(atom);
    if (Atom.isBound(atom)) {
      return lo[h] >= k ? 1 : -lo[h ^ 1] < k ? -1 : 0;
    }
    int equal = !has(h, k) ? -1 : fixed(h) ? 1 : 0;
    return Atom.isUnequal(atom) ? -equal : equal;
  }

  /** Requires {@code h ≥ v}; {@code why} is the caller's token for its explanation. */
  public boolean setMin(int h, int v, int why) {
    if (v <= lo[h]) {
      return true;
    }
    if (v > -lo[h ^ 1]) {
      return fail(Atom.ge(h, v), why);
    }
    save(h, running, why);
    lo[h] = v;
    if (holes.any(h >> 1)) {
      skipHoles(h, v);
    }
    agenda.raised(h, lo[h] == -lo[h ^ 1]);
    return true;
  }

  /** Requires {@code h ≤ v}. */
  public boolean setMax(int h, int v, int why) {
    return setMin(h ^ 1, -v, why);
  }

  /** Requires {@code h = v}. */
  public boolean assign(int h, int v, int why) {
    if (!has(h, v)) {
      return fail(Atom.eq(h, v), why);
    }
    return setMin(h, v, why) && setMin(h ^ 1, -v, why);
  }

  /**
   * Requires {@code h ≠ v}. With learning, a value at an end of the domain goes as a hole first, so
   * that its reason is kept, and the bound that moves on is the store's own change.
   */
  public boolean remove(int h, int v, int why) {
    if (v < lo[h] || v > -lo[h ^ 1]) {
      return true;
    }
    if (fixed(h)) {
      return fail(Atom.ne(h, v), why);
    }
    int end = v == lo[h] ? h : v == -lo[h ^ 1] ? h ^ 1 : NO_END;
    if (end != NO_END && !trail.learning) {
      return setMin(end, lo[end] + 1, why);
    }
    pierce(h >> 1, (h & 1) == 0 ? v : -v, why);
    if (end != NO_END) {
      skipHoles(end, lo[end]);
      agenda.raised(end, fixed(end));
    }
    return true;
  }

  private void pierce(int x, int value, int why) {
    if (!holes.has(x, value)) {
      holes.add(x, value, trail.top);
      int t = trail.add(~x, value);
      if (trail.learning) {
        trail.by[t] = running;
        trail.why[t] = why;
      }
      agenda.pierced(x);
    }
  }

  /** Requires the atom. */
  public boolean require(long atom, int why) {
    int h = Atom.handle(atom);
    int k = Atom.value(atom);
    if (Atom.isBound(atom)) {
      return setMin(h, k, why);
    }
    return Atom.isUnequal(atom) ? remove(h, k, why) : assign(h, k, why);
  }

  /** Says that the running propagator has found a conflict by itself; returns false. */
  public boolean fail(int why) {
    return fail(Atom.FALSE, why);
  }

  private boolean fail(long atom, int why) {
    failedBy = running;
    failedAtom = atom;
    failedWhy = why;
    return false;
  }

  /** Who found the last conflict: a propagator's index, or a maker that is none. */
  int failedBy() {
    return failedBy;
  }

  /** The atom that could not be made true in the last conflict. */
  public long failedAtom() {
    return failedAtom;
  }

  /** The token given with the last conflict. */
  public int failedWhy() {
    return failedWhy;
  }

  /** Lets the running propagator sleep below this node: it can do nothing more there. */
  public void entail() {
    agenda.entail(running);
  }

  /** The value of a cell (see {@link Wiring#cell}). */
  public long get(int cell) {
    return cells.get(cell);
  }

  /** Sets a cell; the old value returns when the search goes back. */
  public void set(int cell, long value) {
    cells.set(cell, value);
  }

  int makeCells(int count, long initial) {
    return cells.make(count, initial);
  }

  /** Keeps three ints for a later explanation and returns a token for them; 0 without learning. */
  public int note(int a, int b, int c) {
    return trail.learning ? trail.note(a, b, c) : 0;
  }

  /** Int {@code i} (0..2) behind a token made by {@link #note}. */
  public int noted(int note, int i) {
    return trail.noted(note, i);
  }

  /** Now, as a time: the number of changes in force. Needs learning, as the next three do. */
  public int now() {
    return trail.top;
  }

  /** Least value of h just before the change at {@code time}. */
  public int minAt(int h, int time) {
    int v = lo[h];
    for (int t = last[h]; t >= time; t = trail.previous[t]) {
      v = trail.old[t];
    }
    return v;
  }

  /** Greatest value of h just before the change at {@code time}. */
  public int maxAt(int h, int time) {
    return -minAt(h ^ 1, time);
  }

  /** Whether {@code value} had left the domain of h before the change at {@code time}. */
  public boolean excludedAt(int h, int value, int time) {
    if (value < minAt(h, time) || value > maxAt(h, time)) {
      return true;
    }
    int v = (h & 1) == 0 ? value : -value;
    return holes.has(h >> 1, v) && holes.time(h >> 1, v) < time;
  }

  /** The current level; 0 is the root. */
  public int level() {
    return level;
  }

  /** Opens a level, whose changes {@link #popTo} can undo. */
  public void push() {
    trail.push(level);
    cells.push(level);
    agenda.push(level);
    level++;
    renew();
  }

  /** Returns to what held when {@code to}, a level before the current one, was left. */
  public void popTo(int to) {
    int down = trail.start(to);
    for (int t = trail.top - 1; t >= down; t--) {
      undo(t);
    }
    trail.top = down;
    trail.popNotes(to);
    cells.popTo(to);
    agenda.popTo(to);
    level = to;
    renew();
  }

  private void undo(int t) {
    int h = trail.handle[t];
    if (h < 0) {
      holes.undo(~h, trail.old[t]);
      return;
    }
    lo[h] = trail.old[t];
    if (trail.learning) {
      last[h] = trail.previous[t];
    }
  }

  private void renew() {
    if (++magic == Integer.MAX_VALUE) {
      Arrays.fill(stamp, 0);
      magic = 1;
    }
  }

  private void save(int h, int by, int why) {
    if (trail.learning) {
      int t = trail.add(h, lo[h]);
      trail.by[t] = by;
      trail.why[t] = why;
      trail.previous[t] = last[h];
      last[h] = t;
    } else if (stamp[h] != magic) {
      stamp[h] = magic;
      trail.add(h, lo[h]);
    }
  }

  /** A bound that lands in a hole moves on; that second change is the store's own. */
  private void skipHoles(int h, int v) {
    int to = (h & 1) == 0 ? holes.next(h >> 1, v) : -holes.previous(h >> 1, -v);
    if (to != v) {
      save(h, OWN, v);
      lo[h] = to;
    }
  }
}
