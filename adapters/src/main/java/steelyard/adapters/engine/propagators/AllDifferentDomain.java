package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * The rows are pairwise different, by matching rows with values: a value stays with a row only if
 * some matching of all rows uses that pair.
 *
 * <p>A pair outside the matching is in another one exactly if it lies on an alternating cycle or an
 * alternating path to a free value, that is within a strongly connected component of the residual
 * graph. The matching is kept and mended from run to run.
 *
 * <p>Strength: domain. Cost: rows times values. Values are numbered from the least to the greatest
 * at the root, so there must not be too many. Not explained yet. Forms: posted and conditional.
 *
 * <p>Source: Régin (1994), A filtering algorithm for constraints of difference in CSPs, AAAI
 * 362-367; components by Tarjan (1972), Depth-first search and linear graph algorithms, SIAM
 * Journal on Computing 1:146-160.
 */
public final class AllDifferentDomain implements Decidable {
  /** Most values from the least to the greatest for which {@link #fits} says yes. */
  private static final int WIDEST = 1 << 14;

  private static final int NONE = -1;

  private final Scope x;
  private final int n;
  private final int least;
  private final int values;
  private final int[] valueOf;
  private final int[] rowOf;
  private final int[] seen;
  private final int[] reachedFrom;
  private final int[] queue;
  private int searches;
  private final Components components;
  private final AllDifferentBounds bounds;

  /** Whether the values of {@code x} are few enough to be numbered. */
  public static boolean fits(Store s, Scope x) {
    return greatest(s, x) - least(s, x) < WIDEST;
  }

  /** The rows of {@code x}, at least one, are pairwise different; they {@link #fits fit}. */
  public AllDifferentDomain(Store s, Scope x) {
    this.x = x;
    n = x.size();
    least = least(s, x);
    values = greatest(s, x) - least + 1;
    valueOf = new int[n];
    rowOf = new int[values];
    Arrays.fill(valueOf, NONE);
    Arrays.fill(rowOf, NONE);
    seen = new int[values];
    reachedFrom = new int[values];
    queue = new int[n];
    components = new Components();
    bounds = new AllDifferentBounds(x);
  }

  private static int least(Store s, Scope x) {
    int least = Store.LIMIT;
    for (int i = 0; i < x.size(); i++) {
      least = Math.min(least, x.min(s, i));
    }
    return least;
  }

  private static int greatest(Store s, Scope x) {
    int greatest = -Store.LIMIT;
    for (int i = 0; i < x.size(); i++) {
      greatest = Math.max(greatest, x.max(s, i));
    }
    return greatest;
  }

  @Override
  public int cost() {
    return QUADRATIC;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAny(x);
  }

  @Override
  public boolean propagate(Store s) {
    if (!match(s)) {
      return s.fail(0);
    }
    components.find(s);
    for (int i = 0; i < n; i++) {
      if (!x.fixed(s, i) && !keepComponent(s, i)) {
        return false;
      }
    }
    return true;
  }

  private boolean keepComponent(Store s, int row) {
    int max = x.max(s, row);
    for (int v = x.min(s, row); v <= max; v++) {
      boolean apart = components.of[row] != components.of[n + v - least];
      if (apart && v - least != valueOf[row] && !x.remove(s, row, v, 0)) {
        return false;
      }
    }
    return true;
  }

  /** Mends the matching after values are gone. False: not all rows can be matched. */
  private boolean match(Store s) {
    for (int i = 0; i < n; i++) {
      if (valueOf[i] != NONE && !x.has(s, i, valueOf[i] + least)) {
        rowOf[valueOf[i]] = NONE;
        valueOf[i] = NONE;
      }
    }
    for (int i = 0; i < n; i++) {
      if (valueOf[i] == NONE) {
        searches++;
        if (!augment(s, i)) {
          return false;
        }
      }
    }
    return true;
  }

  /** Matches the row, moving others along a shortest alternating path if need be. */
  private boolean augment(Store s, int row) {
    queue[0] = row;
    int end = 1;
    for (int head = 0; head < end; head++) {
      int from = queue[head];
      int max = x.max(s, from);
      for (int v = x.min(s, from); v <= max; v++) {
        int value = v - least;
        if (seen[value] != searches && x.has(s, from, v)) {
          seen[value] = searches;
          reachedFrom[value] = from;
          if (rowOf[value] == NONE) {
            shift(value);
            return true;
          }
          queue[end++] = rowOf[value];
        }
      }
    }
    return false;
  }

  /**
   * Gives the free value to the row it was reached from, that row's value to the row before, ...
   */
  private void shift(int free) {
    int value = free;
    while (value != NONE) {
      int row = reachedFrom[value];
      int before = valueOf[row];
      rowOf[value] = row;
      valueOf[row] = value;
      value = before;
    }
  }

  @Override
  public Verdict verdict(Store s) {
    return match(s) ? bounds.verdict(s) : Verdict.FALSE;
  }

  /**
   * The strongly connected components of the residual graph: row → every other value it can take,
   * matched value → its row, free value → sink, sink → every matched value.
   */
  private final class Components {
    private final int sink = n + values;
    private final int[] of = new int[sink + 1];
    private final int[] index = new int[sink + 1];
    private final int[] low = new int[sink + 1];
    private final int[] cursor = new int[sink + 1];
    private final int[] path = new int[sink + 1];
    private final int[] open = new int[sink + 1];
    private int openCount;
    private int visited;
    private int count;

    void find(Store s) {
      Arrays.fill(index, 0);
      Arrays.fill(of, NONE);
      visited = 0;
      count = 0;
      openCount = 0;
      for (int i = 0; i < n; i++) {
        if (index[i] == 0) {
          visit(s, i);
        }
      }
    }

    private void visit(Store s, int root) {
      int depth = 0;
      enter(s, root);
      path[0] = root;
      while (depth >= 0) {
        int node = path[depth];
        int next = successor(s, node);
        if (next == NONE) {
          close(node);
          depth--;
          if (depth >= 0) {
            low[path[depth]] = Math.min(low[path[depth]], low[node]);
          }
        } else if (index[next] == 0) {
          enter(s, next);
          path[++depth] = next;
        } else if (of[next] == NONE) {
          low[node] = Math.min(low[node], index[next]);
        }
      }
    }

    private void enter(Store s, int node) {
      index[node] = ++visited;
      low[node] = visited;
      open[openCount++] = node;
      cursor[node] = node < n ? x.min(s, node) - least : 0;
    }

    private void close(int node) {
      if (low[node] != index[node]) {
        return;
      }
      int member;
      do {
        member = open[--openCount];
        of[member] = count;
      } while (member != node);
      count++;
    }

    private int successor(Store s, int node) {
      if (node < n) {
        int end = x.max(s, node) - least;
        while (cursor[node] <= end) {
          int value = cursor[node]++;
          if (value != valueOf[node] && x.has(s, node, value + least)) {
            return n + value;
          }
        }
        return NONE;
      }
      if (node < sink) {
        int row = rowOf[node - n];
        return cursor[node]++ > 0 ? NONE : row == NONE ? sink : row;
      }
      while (cursor[sink] < values) {
        int value = cursor[sink]++;
        if (rowOf[value] != NONE) {
          return n + value;
        }
      }
      return NONE;
    }
  }
}
