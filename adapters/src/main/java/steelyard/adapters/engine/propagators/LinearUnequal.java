package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code Σ a[i]·h[i] ≠ value}: the last open term loses the value that would complete the sum.
 *
 * <p>Strength: domain. Cost: constant while two open terms are watched, else linear. Explained by
 * the values of the other terms. Forms: posted and conditional; its negation is {@link
 * LinearEqual}.
 *
 * <p>The two positions watched are the idea of Moskewicz et al. (2001, DAC) for clauses; they need
 * not be restored, as going back only opens terms.
 */
public final class LinearUnequal implements Decidable {
  private final long[] a;
  private final int[] h;
  private final long value;
  private int first;
  private int second;

  /** {@code sum ≠ value}; the sum has at least two terms. */
  public LinearUnequal(Sum sum, long value) {
    if (sum.size() < 2) {
      throw new IllegalArgumentException("a sum of at least two terms is needed");
    }
    a = new long[sum.size()];
    h = new int[sum.size()];
    for (int i = 0; i < h.length; i++) {
      a[i] = sum.coefficient(i);
      h[i] = sum.handle(i);
    }
    this.value = value - sum.constant();
    second = 1;
  }

  @Override
  public int cost() {
    return CONSTANT;
  }

  @Override
  public void attach(Wiring wiring) {
    for (int handle : h) {
      wiring.onFix(handle);
    }
  }

  @Override
  public void attachForTruth(Wiring wiring) {
    for (int handle : h) {
      wiring.onBounds(handle);
    }
  }

  @Override
  public boolean propagate(Store s) {
    if (watchTwo(s)) {
      return true;
    }
    s.entail();
    long rest = value - sumWithout(s, first);
    if (s.fixed(h[first])) {
      return rest != a[first] * s.min(h[first]) || s.fail(h.length);
    }
    long forbidden = rest / a[first];
    return rest % a[first] != 0
        || Math.abs(forbidden) > Store.LIMIT
        || s.remove(h[first], (int) forbidden, first);
  }

  /** Whether two open terms are watched; if only one is open, it is {@code first}. */
  private boolean watchTwo(Store s) {
    if (s.fixed(h[first])) {
      int kept = first;
      first = second;
      second = kept;
    }
    if (!s.fixed(h[first]) && !s.fixed(h[second])) {
      return true;
    }
    for (int i = 0; i < h.length; i++) {
      if (!s.fixed(h[i]) && i != first) {
        if (!s.fixed(h[first])) {
          second = i;
          return true;
        }
        first = i;
      }
    }
    return false;
  }

  private long sumWithout(Store s, int self) {
    long sum = 0;
    for (int i = 0; i < h.length; i++) {
      sum += i == self ? 0 : a[i] * s.min(h[i]);
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
    if (value < least || value > greatest) {
      return Verdict.TRUE;
    }
    return least == greatest ? Verdict.FALSE : Verdict.OPEN;
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    for (int i = 0; i < h.length; i++) {
      if (i != why) {
        out.add(Atom.eq(h[i], s.minAt(h[i], time)));
      }
    }
  }

  @Override
  public void explainVerdict(Store s, int time, Verdict verdict, Reason out) {
    if (verdict == Verdict.FALSE) {
      explain(s, time, Atom.FALSE, h.length, out);
    } else {
      out.unexplained();
    }
  }
}
