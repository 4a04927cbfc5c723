package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * Conditional differences {@code when ⇒ x + gap ≤ y}, kept as arcs x → y and -y → -x between
 * handles.
 *
 * <p>Strength: bounds(Z) of each difference, and the condition becomes false when its difference
 * cannot hold. Cost: constant per arc.
 *
 * <p>A cycle of positive length has no solution, but raising bounds around it ends only when a
 * domain is empty, which may take 10^9 rounds. After many raises within one fixpoint the arc that
 * raised each handle last is remembered; a cycle among these is a cycle of positive length
 * (Cherkassky and Goldberg 1999, Negative-cycle detection algorithms, Mathematical Programming
 * 85:277-311) and a conflict.
 */
final class Arcs {
  private static final int CYCLE = -1;

  private final Store store;
  private final Tally tally;
  private int[] source = new int[16];
  private int[] target = new int[16];
  private long[] gap = new long[16];
  private long[] when = new long[16];
  private int[] tag = new int[16];
  private int count;
  private int[] from;
  private int[] conditionAt;
  private int[] conditional;

  private long raises;
  private int round;
  private int[] raisedBy = new int[0];
  private int[] raisedTo = new int[0];
  private int[] raisedIn = new int[0];
  private int[] cycle = new int[0];
  private int cycleSize;

  Arcs(Store store, Tally tally) {
    this.store = store;
    this.tally = tally;
  }

  int size() {
    return count;
  }

  int tag(int arc) {
    return tag[arc];
  }

  int source(int arc) {
    return source[arc];
  }

  int target(int arc) {
    return target[arc];
  }

  long when(int arc) {
    return when[arc];
  }

  /** Adds {@code condition ⇒ x + c ≤ y}; before {@link #freeze} only. */
  void add(int differenceTag, int x, long c, int y, long condition) {
    append(differenceTag, x, c, y, condition);
    append(differenceTag, y ^ 1, c, x ^ 1, condition);
  }

  private void append(int differenceTag, int x, long c, int y, long condition) {
    if (count == source.length) {
      source = Arrays.copyOf(source, 2 * count);
      target = Arrays.copyOf(target, 2 * count);
      gap = Arrays.copyOf(gap, 2 * count);
      when = Arrays.copyOf(when, 2 * count);
      tag = Arrays.copyOf(tag, 2 * count);
    }
    source[count] = x;
    target[count] = y;
    gap[count] = c;
    when[count] = condition;
    tag[count++] = differenceTag;
  }

  /** Sorts the arcs by source and makes the lists of those that wait for a condition. */
  void freeze() {
    int handles = 2 * store.variables();
    sortBySource(handles);
    raisedBy = new int[handles];
    raisedTo = new int[handles];
    raisedIn = new int[handles];
    listByCondition(handles);
    for (int h = 0; h < handles; h++) {
      if (from[h] < from[h + 1] || conditionAt[h] < conditionAt[h + 1]) {
        store.agenda.table(h);
      }
    }
  }

  private void listByCondition(int handles) {
    conditionAt = new int[handles + 1];
    for (int a = 0; a < count; a++) {
      if (when[a] != Atom.TRUE) {
        int h = Atom.handle(when[a]);
        conditionAt[h + 1]++;
        conditionAt[(h ^ 1) + 1] += Atom.isBound(when[a]) ? 0 : 1;
      }
    }
    for (int h = 0; h < handles; h++) {
      conditionAt[h + 1] += conditionAt[h];
    }
    conditional = new int[conditionAt[handles]];
    int[] next = conditionAt.clone();
    for (int a = 0; a < count; a++) {
      if (when[a] != Atom.TRUE) {
        int h = Atom.handle(when[a]);
        conditional[next[h]++] = a;
        if (!Atom.isBound(when[a])) {
          conditional[next[h ^ 1]++] = a;
        }
      }
    }
  }

  private void sortBySource(int handles) {
    from = new int[handles + 1];
    for (int a = 0; a < count; a++) {
      from[source[a] + 1]++;
    }
    for (int h = 0; h < handles; h++) {
      from[h + 1] += from[h];
    }
    int[] next = from.clone();
    int[] s = new int[count];
    int[] t = new int[count];
    long[] g = new long[count];
    long[] w = new long[count];
    int[] n = new int[count];
    for (int a = 0; a < count; a++) {
      int to = next[source[a]]++;
      s[to] = source[a];
      t[to] = target[a];
      g[to] = gap[a];
      w[to] = when[a];
      n[to] = tag[a];
    }
    source = s;
    target = t;
    gap = g;
    when = w;
    tag = n;
  }

  /** A new fixpoint begins. */
  void begin() {
    raises = 0;
    round++;
  }

  /** Follows the arcs that start at handle h or wait for it. False: conflict. */
  boolean propagate(int h) {
    for (int a = from[h]; a < from[h + 1]; a++) {
      if (store.min(h) + gap[a] > store.min(target[a]) && !follow(a)) {
        return false;
      }
    }
    for (int i = conditionAt[h]; i < conditionAt[h + 1]; i++) {
      int a = conditional[i];
      if (store.min(source[a]) + gap[a] > store.min(target[a]) && !follow(a)) {
        return false;
      }
    }
    return true;
  }

  private boolean follow(int a) {
    int truth = store.truth(when[a]);
    if (truth < 0) {
      return true;
    }
    long bound = store.min(source[a]) + gap[a];
    store.running = Store.ARC;
    if (truth == 0) {
      return bound <= store.max(target[a]) || refute(a);
    }
    tally.propagated(tag[a]);
    return store.setMin(target[a], (int) Math.min(bound, Store.LIMIT + 1L), a) && patient(a);
  }

  private boolean refute(int a) {
    tally.propagated(tag[a]);
    return store.require(Atom.not(when[a]), a);
  }

  /**
   * Looks for a positive cycle once this fixpoint has raised far more often than there are arcs.
   */
  private boolean patient(int a) {
    int period = source.length + 1024;
    if (++raises < period) {
      return true;
    }
    int h = target[a];
    raisedBy[h] = a;
    raisedTo[h] = store.min(h);
    raisedIn[h] = round;
    return raises % period != 0 || raises == period || !closes(h) || store.fail(CYCLE);
  }

  /** Whether going back from h along the arcs that raised last runs into a cycle; keeps it. */
  private boolean closes(int h) {
    int at = h;
    for (int steps = 0; steps < raisedBy.length; steps++) {
      if (raisedIn[at] != round || raisedTo[at] != store.min(at)) {
        return false;
      }
      at = source[raisedBy[at]];
    }
    keepCycle(at);
    return true;
  }

  private void keepCycle(int h) {
    cycle = new int[raisedBy.length];
    cycleSize = 0;
    int at = h;
    do {
      cycle[cycleSize++] = raisedBy[at];
      at = source[raisedBy[at]];
    } while (at != h);
  }

  /** The arc to blame for a conflict with the token {@code why}. */
  int blamed(int why) {
    return why == CYCLE ? cycle[0] : why;
  }

  /** Why arc a made {@code atom} true, or the conflict. */
  void explain(int a, long atom, int time, Reason out) {
    if (a == CYCLE) {
      for (int i = 0; i < cycleSize; i++) {
        out.add(when[cycle[i]]);
      }
    } else if (atom == Atom.not(when[a])) {
      int low = store.minAt(source[a], time);
      out.add(Atom.ge(source[a], low));
      out.add(Atom.le(target[a], clamp(low + gap[a] - 1)));
    } else {
      out.add(Atom.ge(source[a], clamp(Atom.value(atom) - gap[a])));
      out.add(when[a]);
    }
  }

  private static int clamp(long v) {
    return (int) Math.max(-Store.LIMIT - 1, Math.min(Store.LIMIT + 1, v));
  }
}
