package steelyard.adapters.engine.core;

import java.util.Arrays;

/** Collects, while constraints are posted, which events wake which propagator. */
public final class Wiring {
  private static final int FIX = 0;
  private static final int BOUND = 1;
  private static final int ANY = 2;

  private final Store store;
  private int[] slot = new int[256];
  private int[] who = new int[256];
  private int size;
  private int propagator;

  Wiring(Store store) {
    this.store = store;
  }

  /** What follows is for propagator p. */
  void begin(int p) {
    propagator = p;
  }

  /** The store, for its domains at the root. */
  public Store store() {
    return store;
  }

  /** Wakes the propagator when h is fixed. */
  public void onFix(int h) {
    add(h, FIX);
    add(h ^ 1, FIX);
  }

  /** Wakes the propagator when the least value of h rises. */
  public void onMin(int h) {
    add(h, BOUND);
  }

  /** Wakes the propagator when the greatest value of h falls. */
  public void onMax(int h) {
    add(h ^ 1, BOUND);
  }

  /** Wakes the propagator when a bound of h changes. */
  public void onBounds(int h) {
    add(h, BOUND);
    add(h ^ 1, BOUND);
  }

  /** Wakes the propagator when h loses any value. */
  public void onAny(int h) {
    add(h, ANY);
    add(h ^ 1, ANY);
  }

  /** Wakes the propagator when the atom may have become true or false. */
  public void onAtom(long atom) {
    if (Atom.isBound(atom)) {
      onBounds(Atom.handle(atom));
    } else {
      onAny(Atom.handle(atom));
    }
  }

  /** {@link #onFix} for every row. */
  public void onFix(Scope x) {
    for (int i = 0; i < x.size(); i++) {
      onFix(x.handle(i));
    }
  }

  /** {@link #onBounds} for every row. */
  public void onBounds(Scope x) {
    for (int i = 0; i < x.size(); i++) {
      onBounds(x.handle(i));
    }
  }

  /** {@link #onAny} for every row. */
  public void onAny(Scope x) {
    for (int i = 0; i < x.size(); i++) {
      onAny(x.handle(i));
    }
  }

  /**
   * Makes {@code count} cells with the same initial value and returns the index of the first; cells
   * are read and written with {@link Store#get} and {@link Store#set}.
   */
  public int cell(int count, long initial) {
    return store.makeCells(count, initial);
  }

  private void add(int h, int segment) {
    if (h >> 1 == Store.ZERO) {
      return;
    }
    if (size == slot.length) {
      slot = Arrays.copyOf(slot, 2 * size);
      who = Arrays.copyOf(who, 2 * size);
    }
    slot[size] = 3 * h + segment;
    who[size++] = propagator;
  }

  /** Where the subscribers of each slot start: slot s of handle h is 3h + segment. */
  int[] segments() {
    int[] at = new int[6 * store.variables() + 1];
    for (int i = 0; i < size; i++) {
      at[slot[i] + 1]++;
    }
    for (int s = 1; s < at.length; s++) {
      at[s] += at[s - 1];
    }
    return at;
  }

  /** The subscribers, slot by slot, in the order in which they were posted. */
  int[] subscribers(int[] segments) {
    int[] next = segments.clone();
    int[] subscribers = new int[size];
    for (int i = 0; i < size; i++) {
      subscribers[next[slot[i]]++] = who[i];
    }
    return subscribers;
  }

  /** The variables that each propagator listens to, each once, as lists by propagator. */
  Lists scopes(int propagators) {
    int[] seenBy = new int[store.variables()];
    Arrays.fill(seenBy, -1);
    Lists scopes = new Lists(propagators);
    for (int i = 0; i < size; i++) {
      int v = slot[i] / 6;
      if (seenBy[v] != who[i]) {
        seenBy[v] = who[i];
        scopes.add(who[i], v);
      }
    }
    return scopes;
  }
}
