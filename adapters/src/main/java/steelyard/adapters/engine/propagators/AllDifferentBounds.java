package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * The rows are pairwise different, by {@link HallIntervals} from below and, mirrored, from above.
 *
 * <p>Strength: bounds(Z) at the fixpoint. Cost: n log n, nearly linear when few bounds change
 * order. Not explained yet. Forms: posted and conditional; the verdict is FALSE when some interval
 * has more rows than values, TRUE when the ranges are disjoint.
 */
public final class AllDifferentBounds implements Decidable {
  private final Scope x;
  private final HallIntervals below;
  private final HallIntervals above;
  private final int[] order;
  private final int[] min;

  /** The rows of {@code x} are pairwise different. */
  public AllDifferentBounds(Scope x) {
    this.x = x;
    below = new HallIntervals(x);
    above = new HallIntervals(x.negated());
    order = Orders.identity(x.size());
    min = new int[x.size()];
  }

  @Override
  public int cost() {
    return LOGLINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onBounds(x);
  }

  @Override
  public boolean propagate(Store s) {
    return x.size() < 2 || (below.raise(s) && above.raise(s));
  }

  @Override
  public Verdict verdict(Store s) {
    if (x.size() < 2) {
      return Verdict.TRUE;
    }
    if (!below.feasible(s)) {
      return Verdict.FALSE;
    }
    for (int i = 0; i < min.length; i++) {
      min[i] = x.min(s, i);
    }
    Orders.sort(order, min);
    for (int k = 1; k < order.length; k++) {
      if (x.max(s, order[k - 1]) >= min[order[k]]) {
        return Verdict.OPEN;
      }
    }
    return Verdict.TRUE;
  }
}
