package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Propagator;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Wiring;

/**
 * The rows are pairwise different: the value of a fixed row leaves all others.
 *
 * <p>Strength: that of the pairwise disequalities. Cost: linear per fixed row; fixed rows are moved
 * to the front of a permutation and handled once per branch. Explained by the fixed row. For posted
 * relations, beside a stronger propagator.
 */
public final class AllDifferentValues implements Propagator {
  private final Scope x;
  private final int[] order;
  private int done;

  /** The rows of {@code x} are pairwise different. */
  public AllDifferentValues(Scope x) {
    this.x = x;
    order = Orders.identity(x.size());
  }

  @Override
  public int cost() {
    return LINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onFix(x);
    done = wiring.cell(1, 0);
  }

  @Override
  public boolean propagate(Store s) {
    int fixed = (int) s.get(done);
    for (int k = fixed; k < order.length; k++) {
      int row = order[k];
      if (x.fixed(s, row)) {
        order[k] = order[fixed];
        order[fixed++] = row;
        if (!removeFromOthers(s, row, fixed)) {
          return false;
        }
        k = fixed - 1;
      }
    }
    s.set(done, fixed);
    return true;
  }

  private boolean removeFromOthers(Store s, int row, int from) {
    int value = x.min(s, row);
    for (int k = from; k < order.length; k++) {
      if (!x.remove(s, order[k], value, row)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    out.add(Atom.eq(x.handle(why), s.minAt(x.handle(why), time)));
  }
}
