package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * What is left to do before the fixpoint: touched handles, for the tables of clauses and
 * differences, and propagators in one queue per cost class.
 *
 * <p>The subscribers of handle h stand side by side in three segments, fix | bounds | any, so that
 * one loop over a range serves an event: a raised bound that fixes wakes all three, one that does
 * not wakes the last two, a hole wakes the last.
 */
final class Agenda {
  private static final byte QUEUED = 1;
  private static final byte ENTAILED = 2;

  private int[] at;
  private int[] subscriber;
  private byte[] cost;
  private byte[] state;
  private boolean[] tabled = new boolean[0];

  private final int[][] ring = new int[Propagator.CLASSES][];
  private final int[] head = new int[Propagator.CLASSES];
  private final int[] tail = new int[Propagator.CLASSES];
  private int mask;
  private int ready;

  private int[] touched;
  private boolean[] isTouched;
  private int touchedMask;
  private int touchedHead;
  private int touchedTail;

  private int[] entailed;
  private int entailedTop;
  private int[] levelEntailed = new int[64];

  /** Fixes who listens to what. */
  void freeze(int[] segments, int[] subscribers, byte[] costs) {
    at = segments;
    subscriber = subscribers;
    cost = costs;
    state = new byte[costs.length];
    entailed = new int[costs.length];
    int room = Integer.highestOneBit(Math.max(1, costs.length)) << 1;
    mask = room - 1;
    for (int c = 0; c < ring.length; c++) {
      ring[c] = new int[room];
    }
    int handles = segments.length / 3;
    tabled = Arrays.copyOf(tabled, handles);
    isTouched = new boolean[handles];
    touched = new int[Integer.highestOneBit(Math.max(1, handles)) << 1];
    touchedMask = touched.length - 1;
  }

  boolean frozen() {
    return at != null;
  }

  /** From now on events of the handle are for the tables too. */
  void table(int h) {
    if (h >= tabled.length) {
      tabled = Arrays.copyOf(tabled, Math.max(h + 1, 2 * tabled.length));
    }
    tabled[h] = true;
  }

  /** Handle h was raised. */
  void raised(int h, boolean fixed) {
    if (at == null) {
      return;
    }
    if (tabled[h]) {
      touch(h);
    }
    int end = at[3 * h + 3];
    for (int i = fixed ? at[3 * h] : at[3 * h + 1]; i < end; i++) {
      wake(subscriber[i]);
    }
  }

  /** Variable v got a hole. */
  void pierced(int v) {
    if (at == null) {
      return;
    }
    int h = 2 * v;
    if (tabled[h]) {
      touch(h);
    }
    for (int i = at[3 * h + 2]; i < at[3 * h + 3]; i++) {
      wake(subscriber[i]);
    }
  }

  void wake(int p) {
    if (state[p] == 0) {
      state[p] = QUEUED;
      int c = cost[p];
      ring[c][tail[c]++ & mask] = p;
      ready |= 1 << c;
    }
  }

  void touch(int h) {
    if (!isTouched[h]) {
      isTouched[h] = true;
      touched[touchedTail++ & touchedMask] = h;
    }
  }

  /** The next touched handle, or -1. */
  int nextTouched() {
    if (touchedHead == touchedTail) {
      return -1;
    }
    int h = touched[touchedHead++ & touchedMask];
    isTouched[h] = false;
    return h;
  }

  /** The next propagator of the cheapest class that has one, or -1. */
  int nextWoken() {
    if (ready == 0) {
      return -1;
    }
    int c = Integer.numberOfTrailingZeros(ready);
    int p = ring[c][head[c]++ & mask];
    if (head[c] == tail[c]) {
      ready &= ~(1 << c);
    }
    state[p] &= ~QUEUED;
    return p;
  }

  /** Lets p sleep until the current level is left. */
  void entail(int p) {
    if ((state[p] & ENTAILED) == 0) {
      state[p] |= ENTAILED;
      entailed[entailedTop++] = p;
    }
  }

  void push(int level) {
    if (level == levelEntailed.length) {
      levelEntailed = Arrays.copyOf(levelEntailed, 2 * level);
    }
    levelEntailed[level] = entailedTop;
  }

  void popTo(int level) {
    int down = levelEntailed[level];
    while (entailedTop > down) {
      state[entailed[--entailedTop]] &= ~ENTAILED;
    }
  }

  /** Forgets all that is left to do. */
  void clear() {
    while (nextTouched() >= 0) {}
    while (nextWoken() >= 0) {}
    touchedHead = 0;
    touchedTail = 0;
    Arrays.fill(head, 0);
    Arrays.fill(tail, 0);
  }
}
