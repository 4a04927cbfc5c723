package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * The result is the greatest of the terms; a minimum is the same over negated scopes.
 *
 * <p>Strength: bounds(Z). Cost: linear, no state. Explained. Forms: posted and conditional.
 *
 * <p>Source: the rules are common practice; for instance Beldiceanu (2001), Pruning for the minimum
 * constraint family and for the number of distinct values constraint family, CP, LNCS 2239:211-224.
 */
public final class Maximum implements Decidable {
  /** Tokens: the result is below all, a term is below the result, and two for each term. */
  private static final int BELOW_ALL = 0;

  private static final int BELOW_RESULT = 1;
  private static final int FIRST = 2;

  private final Scope x;
  private final int n;

  /** {@code result} is one row. */
  public Maximum(Scope terms, Scope result) {
    if (terms.size() == 0 || result.size() != 1) {
      throw new IllegalArgumentException("a maximum has terms and one result");
    }
    n = terms.size();
    x = terms.and(result);
  }

  @Override
  public int cost() {
    return n <= 2 ? CONSTANT : LINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onBounds(x);
  }

  @Override
  public boolean propagate(Store s) {
    int reach = Integer.MIN_VALUE;
    for (int i = 0; i < n; i++) {
      reach = Math.max(reach, x.max(s, i));
      if (!x.setMin(s, n, x.min(s, i), FIRST + i)) {
        return false;
      }
    }
    if (!x.setMax(s, n, reach, BELOW_ALL)) {
      return false;
    }
    int least = x.min(s, n);
    int greatest = x.max(s, n);
    int candidates = 0;
    int candidate = 0;
    for (int i = 0; i < n; i++) {
      if (!x.setMax(s, i, greatest, BELOW_RESULT)) {
        return false;
      }
      if (x.max(s, i) >= least) {
        candidates++;
        candidate = i;
      }
    }
    return candidates != 1 || x.setMin(s, candidate, least, FIRST + n + candidate);
  }

  @Override
  public Verdict verdict(Store s) {
    int floor = Integer.MIN_VALUE;
    int reach = Integer.MIN_VALUE;
    for (int i = 0; i < n; i++) {
      floor = Math.max(floor, x.min(s, i));
      reach = Math.max(reach, x.max(s, i));
    }
    if (floor > x.max(s, n) || reach < x.min(s, n)) {
      return Verdict.FALSE;
    }
    return floor == reach && x.fixed(s, n) ? Verdict.TRUE : Verdict.OPEN;
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    if (why == BELOW_ALL) {
      for (int i = 0; i < n; i++) {
        out.add(x.le(i, x.upper(n, atom)));
      }
    } else if (why == BELOW_RESULT) {
      out.add(x.le(n, x.upper(rowOf(atom), atom)));
    } else if (why < FIRST + n) {
      out.add(x.ge(why - FIRST, x.lower(n, atom)));
    } else {
      int row = why - FIRST - n;
      out.add(x.ge(n, x.lower(row, atom)));
      for (int i = 0; i < n; i++) {
        if (i != row) {
          out.add(x.le(i, x.lower(row, atom) - 1));
        }
      }
    }
  }

  private int rowOf(long atom) {
    int row = 0;
    while (x.handle(row) != (Atom.handle(atom) ^ 1)) {
      row++;
    }
    return row;
  }
}
