package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * Clauses over atoms: in each, some atom is true.
 *
 * <p>Strength: unit propagation. Each clause watches two of its atoms that are not false; only when
 * one becomes false is the clause looked at (Moskewicz, Madigan, Zhao, Zhang and Malik 2001, Chaff:
 * engineering an efficient SAT solver, DAC). A watch on a bound lies at the handle whose rise makes
 * the bound false, with the threshold beside it, so that most visits end with one comparison;
 * watches on [x = k] and [x ≠ k] lie at the variable.
 */
final class Clauses {
  private final Store store;
  private final Tally tally;
  private long[] literal = new long[64];
  private int[] start = new int[17];
  private int[] tag = new int[16];
  private int count;
  private int attached;
  private int[][] bounds = new int[0][];
  private int[] boundsSize = new int[0];
  private int[][] values = new int[0][];
  private int[] valuesSize = new int[0];

  Clauses(Store store, Tally tally) {
    this.store = store;
    this.tally = tally;
  }

  int size() {
    return count;
  }

  int tag(int clause) {
    return tag[clause];
  }

  int first(int clause) {
    return start[clause];
  }

  int end(int clause) {
    return start[clause + 1];
  }

  long literal(int position) {
    return literal[position];
  }

  /** Stores a clause; it is watched from the next {@link #attachNew} on. */
  void add(int clauseTag, long[] atoms, int size) {
    if (count == tag.length) {
      tag = Arrays.copyOf(tag, 2 * count);
      start = Arrays.copyOf(start, 2 * count + 1);
    }
    int from = start[count];
    if (from + size > literal.length) {
      literal = Arrays.copyOf(literal, Math.max(from + size, 2 * literal.length));
    }
    System.arraycopy(atoms, 0, literal, from, size);
    tag[count++] = clauseTag;
    start[count] = from + size;
  }

  /** Watches the clauses added since the last call; at the root only. False: conflict. */
  boolean attachNew() {
    if (bounds.length < 2 * store.variables()) {
      bounds = Arrays.copyOf(bounds, 2 * store.variables());
      boundsSize = Arrays.copyOf(boundsSize, bounds.length);
      values = Arrays.copyOf(values, store.variables());
      valuesSize = Arrays.copyOf(valuesSize, values.length);
    }
    while (attached < count) {
      if (!attach(attached++)) {
        return false;
      }
    }
    return true;
  }

  private boolean attach(int c) {
    int open = start[c];
    for (int i = start[c]; i < start[c + 1]; i++) {
      int truth = store.truth(literal[i]);
      if (truth > 0) {
        return true;
      }
      if (truth == 0) {
        swap(open++, i);
      }
    }
    if (open - start[c] < 2) {
      return imply(c, open == start[c] ? Atom.FALSE : literal[start[c]]);
    }
    watch(literal[start[c]], c);
    watch(literal[start[c] + 1], c);
    return true;
  }

  private void swap(int i, int j) {
    long kept = literal[i];
    literal[i] = literal[j];
    literal[j] = kept;
  }

  private boolean imply(int c, long atom) {
    store.running = Store.CLAUSE;
    return store.require(atom, c);
  }

  private void watch(long atom, int c) {
    int h = Atom.handle(atom);
    if (Atom.isBound(atom)) {
      int falsifier = h ^ 1;
      store.agenda.table(falsifier);
      bounds[falsifier] = put(bounds[falsifier], boundsSize[falsifier], 1 - Atom.value(atom), c);
      boundsSize[falsifier] += 2;
    } else {
      int v = h >> 1;
      store.agenda.table(h);
      store.agenda.table(h ^ 1);
      int clauseAndSign = c << 1 | (Atom.isUnequal(atom) ? 1 : 0);
      values[v] = put(values[v], valuesSize[v], Atom.value(atom), clauseAndSign);
      valuesSize[v] += 2;
    }
  }

  private static int[] put(int[] list, int size, int a, int b) {
    int[] room = list;
    if (room == null) {
      room = new int[4];
    } else if (size == room.length) {
      room = Arrays.copyOf(room, 2 * size);
    }
    room[size] = a;
    room[size + 1] = b;
    return room;
  }

  /** Looks at what a change of handle h made false. False: conflict. */
  boolean propagate(int h) {
    return (boundsSize[h] == 0 || visitBounds(h)) && (valuesSize[h >> 1] == 0 || visitValues(h));
  }

  private boolean visitBounds(int h) {
    int low = store.min(h);
    boolean consistent = true;
    int kept = 0;
    int i = 0;
    while (i < boundsSize[h] && consistent) {
      int threshold = bounds[h][i];
      int c = bounds[h][i + 1];
      i += 2;
      if (low >= threshold) {
        if (moved(c, Atom.ge(h ^ 1, 1 - threshold))) {
          continue;
        }
        consistent = holds(c);
      }
      bounds[h][kept] = threshold;
      bounds[h][kept + 1] = c;
      kept += 2;
    }
    System.arraycopy(bounds[h], i, bounds[h], kept, boundsSize[h] - i);
    boundsSize[h] -= i - kept;
    return consistent;
  }

  private boolean visitValues(int h) {
    int v = h >> 1;
    boolean consistent = true;
    int kept = 0;
    int i = 0;
    while (i < valuesSize[v] && consistent) {
      int value = values[v][i];
      int clauseAndSign = values[v][i + 1];
      i += 2;
      long atom = (clauseAndSign & 1) == 0 ? Atom.eq(2 * v, value) : Atom.ne(2 * v, value);
      if (store.truth(atom) < 0) {
        if (moved(clauseAndSign >> 1, atom)) {
          continue;
        }
        consistent = holds(clauseAndSign >> 1);
      }
      values[v][kept] = value;
      values[v][kept + 1] = clauseAndSign;
      kept += 2;
    }
    System.arraycopy(values[v], i, values[v], kept, valuesSize[v] - i);
    valuesSize[v] -= i - kept;
    return consistent;
  }

  /** Moves the watch of clause c from {@code gone}, which is false, if another atom can take it. */
  private boolean moved(int c, long gone) {
    tally.propagated(tag[c]);
    int first = start[c];
    if (literal[first] == gone) {
      swap(first, first + 1);
    }
    if (store.truth(literal[first]) > 0) {
      return false;
    }
    for (int i = first + 2; i < start[c + 1]; i++) {
      if (store.truth(literal[i]) >= 0) {
        swap(first + 1, i);
        watch(literal[first + 1], c);
        return true;
      }
    }
    return false;
  }

  /** Clause c has only its first atom left: requires it. */
  private boolean holds(int c) {
    long only = literal[start[c]];
    return store.truth(only) > 0 || imply(c, only);
  }

  /** The other atoms of clause c are false: why {@code atom}, or the conflict, follows. */
  void explain(int c, long atom, Reason out) {
    for (int i = start[c]; i < start[c + 1]; i++) {
      if (literal[i] != atom) {
        out.add(Atom.not(literal[i]));
      }
    }
  }
}
