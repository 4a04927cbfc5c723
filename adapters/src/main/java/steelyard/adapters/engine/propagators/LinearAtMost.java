package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code Σ a[i]·h[i] ≤ bound}: a term may exceed its least value by at most the slack.
 *
 * <p>Strength: bounds(Z); without holes one run is a fixpoint. Cost: linear, no state. Explained by
 * the other terms' bounds, weakened as far as the slack goes. Forms: posted, conditional, and its
 * negation is of the same kind.
 *
 * <p>Source: Harvey and Schimpf (2002), Bounds consistency techniques for long linear constraints,
 * TRICS workshop at CP.
 */
public final class LinearAtMost implements Decidable {
  private final long[] a;
  private final int[] h;
  private final long constant;
  private final int firstToken;
  private long bound;

  /** {@code sum ≤ bound}. */
  public LinearAtMost(Sum sum, long bound) {
    this(sum, bound, 0);
  }

  /** As above, with tokens from {@code firstToken}: one per term, and one for its own conflict. */
  LinearAtMost(Sum sum, long bound, int firstToken) {
    a = new long[sum.size()];
    h = new int[sum.size()];
    for (int i = 0; i < h.length; i++) {
      a[i] = sum.coefficient(i);
      h[i] = sum.handle(i);
    }
    constant = sum.constant();
    this.bound = bound - constant;
    this.firstToken = firstToken;
  }

  /** Lowers the bound for good, to {@code sum ≤ newBound}. */
  public void tightenTo(long newBound) {
    bound = newBound - constant;
  }

  @Override
  public int cost() {
    return h.length <= 3 ? CONSTANT : LINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    for (int handle : h) {
      wiring.onMin(handle);
    }
  }

  @Override
  public void attachForTruth(Wiring wiring) {
    for (int handle : h) {
      wiring.onMax(handle);
    }
  }

  @Override
  public boolean propagate(Store s) {
    long slack = bound - least(s);
    if (slack < 0) {
      return s.fail(firstToken + h.length);
    }
    for (int i = 0; i < h.length; i++) {
      int min = s.min(h[i]);
      if (a[i] * (s.max(h[i]) - (long) min) > slack
          && !s.setMax(h[i], (int) (min + slack / a[i]), firstToken + i)) {
        return false;
      }
    }
    return true;
  }

  private long least(Store s) {
    long sum = 0;
    for (int i = 0; i < h.length; i++) {
      sum += a[i] * s.min(h[i]);
    }
    return sum;
  }

  @Override
  public Verdict verdict(Store s) {
    long least = 0;
    long greatest = 0;
    for (int i = 0; i < h.length; i++) {
      least += a[i] * s.min(h[i]);
      greatest += a[i] * s.max(h[i]);
    }
    return least > bound ? Verdict.FALSE : greatest <= bound ? Verdict.TRUE : Verdict.OPEN;
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    int self = why - firstToken;
    long excess = -bound - 1;
    if (self < h.length) {
      excess += a[self] * (1L - Atom.value(atom));
    }
    explainAbove(s, time, self, excess, out);
  }

  /** Adds why the terms but {@code self} sum to more than {@code -excess - 1}. */
  private void explainAbove(Store s, int time, int self, long excess, Reason out) {
    long spare = excess;
    for (int i = 0; i < h.length; i++) {
      spare += i == self ? 0 : a[i] * s.minAt(h[i], time);
    }
    for (int i = 0; i < h.length; i++) {
      if (i != self) {
        int min = s.minAt(h[i], time);
        int weaker = (int) Math.max(s.minAt(h[i], 0), min - spare / a[i]);
        spare -= a[i] * (min - (long) weaker);
        if (weaker > s.minAt(h[i], 0)) {
          out.add(Atom.ge(h[i], weaker));
        }
      }
    }
  }

  @Override
  public void explainVerdict(Store s, int time, Verdict verdict, Reason out) {
    if (verdict == Verdict.FALSE) {
      explainAbove(s, time, h.length, -bound - 1, out);
      return;
    }
    long spare = bound;
    for (int i = 0; i < h.length; i++) {
      spare -= a[i] * s.maxAt(h[i], time);
    }
    for (int i = 0; i < h.length; i++) {
      int max = s.maxAt(h[i], time);
      int weaker = (int) Math.min(s.maxAt(h[i], 0), max + spare / a[i]);
      spare -= a[i] * (weaker - (long) max);
      if (weaker < s.maxAt(h[i], 0)) {
        out.add(Atom.le(h[i], weaker));
      }
    }
  }
}
