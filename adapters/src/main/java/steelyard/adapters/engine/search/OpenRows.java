package steelyard.adapters.engine.search;

import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * Picks the open row of a scope that a {@link VariableOrder} puts first; ties go by a permutation.
 *
 * <p>Open rows are the front of a permutation whose length is a cell of the store (Briggs and
 * Torczon 1993, An efficient representation for sparse sets, ACM Letters on Programming Languages
 * and Systems 2), so a fixed row is looked at once per branch. In input order the cell counts the
 * rows from the first open one on.
 */
final class OpenRows {
  private static final int NONE = -1;

  private final Network network;
  private final Scope rows;
  private final VariableOrder order;
  private final int[] rank;
  private final int[] open;
  private final int openCount;

  OpenRows(Network network, Scope rows, VariableOrder order, long seed) {
    this.network = network;
    this.rows = rows;
    this.order = order;
    rank = Shuffle.permutation(rows.size(), seed);
    open = Shuffle.permutation(rows.size(), 0);
    openCount = network.cell(open.length);
  }

  /** The handle of the row to decide, or -1 if all are fixed. */
  int pick(Store s) {
    int row = order == VariableOrder.INPUT ? first(s) : best(s);
    return row == NONE ? NONE : rows.handle(row);
  }

  private int first(Store s) {
    int fixed = open.length - (int) s.get(openCount);
    while (fixed < open.length && rows.fixed(s, fixed)) {
      fixed++;
    }
    s.set(openCount, open.length - fixed);
    return fixed < open.length ? fixed : NONE;
  }

  private int best(Store s) {
    int count = (int) s.get(openCount);
    int best = NONE;
    for (int i = count - 1; i >= 0; i--) {
      int row = open[i];
      if (rows.fixed(s, row)) {
        count--;
        open[i] = open[count];
        open[count] = row;
      } else if (best == NONE || before(s, row, best)) {
        best = row;
      }
    }
    s.set(openCount, count);
    return best;
  }

  private boolean before(Store s, int row, int best) {
    long difference = compare(s, row, best);
    return difference < 0 || (difference == 0 && rank[row] < rank[best]);
  }

  private long compare(Store s, int a, int b) {
    int x = rows.handle(a);
    int y = rows.handle(b);
    return switch (order) {
      case INPUT -> a - b;
      case SMALLEST_DOMAIN -> s.size(x) - s.size(y);
      case LARGEST_DOMAIN -> s.size(y) - s.size(x);
      case SMALLEST_MIN -> (long) rows.min(s, a) - rows.min(s, b);
      case LARGEST_MAX -> (long) rows.max(s, b) - rows.max(s, a);
      case WEIGHTED_DEGREE -> s.size(x) * network.weight(y) - s.size(y) * network.weight(x);
    };
  }
}
