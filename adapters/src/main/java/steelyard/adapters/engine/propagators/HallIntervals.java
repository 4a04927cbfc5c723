package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * Raises the least values of pairwise different rows past the Hall intervals they cannot enter.
 *
 * <p>A Hall interval holds as many rows as it has values. Rows are taken by greatest value; a
 * union-find over the distinct bounds keeps how much room is left ({@code spare}) and another the
 * intervals found full ({@code full}). Orders are kept between runs and mended by insertion sort.
 *
 * <p>Source: López-Ortiz, Quimper, Tromp and van Beek (2003), A fast and simple algorithm for
 * bounds consistency of the alldifferent constraint, IJCAI 245-250, figures 2 to 4.
 */
final class HallIntervals {
  private final Scope x;
  private final int n;
  private final int[] byMin;
  private final int[] byMax;
  private final int[] min;
  private final int[] max;
  private final int[] minRank;
  private final int[] maxRank;
  private final int[] bound;
  private final int[] tree;
  private final int[] spare;
  private final int[] full;
  private int ranks;

  HallIntervals(Scope x) {
    this.x = x;
    n = x.size();
    byMin = Orders.identity(n);
    byMax = Orders.identity(n);
    min = new int[n];
    max = new int[n];
    minRank = new int[n];
    maxRank = new int[n];
    bound = new int[2 * n + 2];
    tree = new int[2 * n + 2];
    spare = new int[2 * n + 2];
    full = new int[2 * n + 2];
  }

  /** Raises what must be raised. False: some interval has more rows than values. */
  boolean raise(Store s) {
    prepare(s);
    for (int k = 0; k < n; k++) {
      if (!place(byMax[k])) {
        return s.fail(0);
      }
      int row = byMax[k];
      if (min[row] > x.min(s, row) && !x.setMin(s, row, min[row], 0)) {
        return false;
      }
    }
    return true;
  }

  /** Whether no interval has more rows than values. */
  boolean feasible(Store s) {
    prepare(s);
    for (int k = 0; k < n; k++) {
      if (!place(byMax[k])) {
        return false;
      }
    }
    return true;
  }

  private void prepare(Store s) {
    for (int i = 0; i < n; i++) {
      min[i] = x.min(s, i);
      max[i] = x.max(s, i);
    }
    Orders.sort(byMin, min);
    Orders.sort(byMax, max);
    rank();
    for (int r = 1; r <= ranks + 1; r++) {
      tree[r] = r - 1;
      full[r] = r - 1;
      spare[r] = bound[r] - bound[r - 1];
    }
  }

  /** Numbers the distinct values of min and max + 1 from 1 on, with a far value at either end. */
  private void rank() {
    int last = min[byMin[0]] - 2;
    bound[0] = last;
    ranks = 0;
    int i = 0;
    for (int j = 0; j < n; ) {
      boolean takeMin = i < n && min[byMin[i]] <= max[byMax[j]] + 1;
      int value = takeMin ? min[byMin[i]] : max[byMax[j]] + 1;
      if (value != last) {
        bound[++ranks] = value;
        last = value;
      }
      if (takeMin) {
        minRank[byMin[i++]] = ranks;
      } else {
        maxRank[byMax[j++]] = ranks;
      }
    }
    bound[ranks + 1] = bound[ranks] + 2;
  }

  /** Takes the first place after the row's least value, and notes the least value it may have. */
  private boolean place(int row) {
    int from = minRank[row];
    int to = maxRank[row];
    int room = root(tree, from + 1);
    int before = tree[room];
    if (--spare[room] == 0) {
      tree[room] = room + 1;
      room = root(tree, room + 1);
      tree[room] = before;
    }
    compress(tree, from + 1, room, room);
    int beyond = bound[room] - bound[to];
    if (spare[room] < beyond) {
      return false;
    }
    if (full[from] > from) {
      int free = root(full, full[from]);
      min[row] = bound[free];
      compress(full, from, free, free);
    }
    if (spare[room] == beyond) {
      compress(full, full[to], before - 1, to);
      full[to] = before - 1;
    }
    return true;
  }

  private static int root(int[] link, int start) {
    int at = start;
    while (link[at] > at) {
      at = link[at];
    }
    return at;
  }

  /** Points everything on the path from {@code start} to {@code end} to {@code to}. */
  private static void compress(int[] link, int start, int end, int to) {
    int at = start;
    while (at != end) {
      int next = link[at];
      link[at] = to;
      at = next;
    }
  }
}
