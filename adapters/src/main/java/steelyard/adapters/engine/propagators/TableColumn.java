package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import java.util.TreeSet;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Wiring;

/** One column of a {@link Table}: the values that tuples have there, and which tuples have each. */
final class TableColumn {
  private final Scope x;
  private final int row;
  private final boolean narrow;
  private final int[] values;
  private final long[][] support;
  private final long[][] strict;
  private final int[] order;
  private final int[] residue;

  /**
   * Holds how many values are open, the front of {@code order}; as its complement before the first
   * run.
   */
  private int openCell;

  /** What changed since the last look, as the mask that tells it. */
  enum Change {
    /** Nothing. */
    NONE,
    /** The mask has the tuples that remain possible. */
    REMAINING,
    /** The mask has the tuples that are gone. */
    GONE
  }

  /** Column {@code row} of {@code count} tuples of the arity of {@code x}. */
  TableColumn(Store s, Scope x, int row, int[] tuples, int count, int words) {
    this.x = x;
    this.row = row;
    narrow = x.max(s, row) - x.min(s, row) < Table.NARROW;
    int[] entries = IntStream.range(0, count).map(t -> tuples[t * x.size() + row]).toArray();
    boolean any = IntStream.of(entries).anyMatch(v -> v == Table.ANY);
    values = any ? domain(s) : listed(entries);
    support = new long[values.length][words];
    strict = any ? new long[values.length][words] : support;
    order = IntStream.range(0, values.length).toArray();
    residue = new int[values.length];
    for (int t = 0; t < count; t++) {
      long bit = 1L << t;
      if (entries[t] == Table.ANY) {
        for (long[] tuplesOfValue : support) {
          tuplesOfValue[t >> 6] |= bit;
        }
      } else {
        int position = Arrays.binarySearch(values, entries[t]);
        support[position][t >> 6] |= bit;
        strict[position][t >> 6] |= bit;
      }
    }
  }

  private int[] domain(Store s) {
    return IntStream.rangeClosed(x.min(s, row), x.max(s, row))
        .filter(v -> x.has(s, row, v))
        .toArray();
  }

  private static int[] listed(int[] entries) {
    TreeSet<Integer> distinct = new TreeSet<>();
    for (int v : entries) {
      distinct.add(v);
    }
    return distinct.stream().mapToInt(Integer::intValue).toArray();
  }

  void attach(Wiring wiring) {
    openCell = wiring.cell(1, ~values.length);
  }

  /** Notes which values are gone and puts the tuples concerned into {@code mask}. */
  Change update(Store s, long[] mask) {
    int cell = (int) s.get(openCell);
    if (narrow && s.size(x.handle(row)) == cell) {
      return Change.NONE;
    }
    int open = cell < 0 ? ~cell : cell;
    int kept = open;
    for (int k = open - 1; k >= 0; k--) {
      if (!x.has(s, row, values[order[k]])) {
        swap(k, --kept);
      }
    }
    s.set(openCell, kept);
    if (kept == open) {
      return Change.NONE;
    }
    Arrays.fill(mask, 0);
    boolean gone = open - kept < kept;
    for (int k = gone ? kept : 0; k < (gone ? open : kept); k++) {
      unite(mask, gone ? strict[order[k]] : support[order[k]]);
    }
    return gone ? Change.GONE : Change.REMAINING;
  }

  private static void unite(long[] mask, long[] set) {
    for (int w = 0; w < mask.length; w++) {
      mask[w] |= set[w];
    }
  }

  private void swap(int k, int l) {
    int kept = order[k];
    order[k] = order[l];
    order[l] = kept;
  }

  /** Removes the values without a valid tuple. */
  boolean filter(Store s, TupleSet valid) {
    int open = (int) s.get(openCell);
    int least = Integer.MAX_VALUE;
    int greatest = Integer.MIN_VALUE;
    for (int k = open - 1; k >= 0; k--) {
      int position = order[k];
      int word = valid.meeting(s, support[position], residue[position]);
      if (word < 0) {
        swap(k, --open);
        if (!x.remove(s, row, values[position], 0)) {
          return false;
        }
      } else {
        residue[position] = word;
        least = Math.min(least, values[position]);
        greatest = Math.max(greatest, values[position]);
      }
    }
    s.set(openCell, open);
    return x.setMin(s, row, least, 0)
        && x.setMax(s, row, greatest, 0)
        && (!narrow || s.size(x.handle(row)) == open || removeUnlisted(s));
  }

  private boolean removeUnlisted(Store s) {
    int max = x.max(s, row);
    for (int v = x.min(s, row); v <= max; v++) {
      if (Arrays.binarySearch(values, v) < 0 && !x.remove(s, row, v, 0)) {
        return false;
      }
    }
    return true;
  }

  /** Takes from {@code possible} the tuples whose value here is not in the domain. */
  void restrict(Store s, long[] possible, long[] scratch) {
    Arrays.fill(scratch, 0);
    for (int position = 0; position < values.length; position++) {
      if (x.has(s, row, values[position])) {
        unite(scratch, support[position]);
      }
    }
    for (int w = 0; w < possible.length; w++) {
      possible[w] &= scratch[w];
    }
  }
}
