package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code Σ a[i]·h[i] = value}, as at most and at least.
 *
 * <p>Strength: the bounds consistency of both inequalities, weaker than bounds(Z) of the equation
 * where coefficients differ. Cost: linear, no state. Forms: posted and conditional; its negation is
 * {@link LinearUnequal}.
 *
 * <p>Source: Harvey and Schimpf (2002), as for {@link LinearAtMost}.
 */
public final class LinearEqual implements Decidable {
  private final Sum sum;
  private final LinearAtMost atMost;
  private final LinearAtMost atLeast;
  private final int turn;

  /** {@code sum = value}. */
  public LinearEqual(Sum sum, long value) {
    this.sum = sum;
    turn = sum.size() + 1;
    atMost = new LinearAtMost(sum, value);
    atLeast = new LinearAtMost(sum.negated(), -value, turn);
  }

  @Override
  public int cost() {
    return atMost.cost();
  }

  @Override
  public void attach(Wiring wiring) {
    for (int i = 0; i < sum.size(); i++) {
      wiring.onBounds(sum.handle(i));
    }
  }

  @Override
  public boolean propagate(Store s) {
    return atMost.propagate(s) && atLeast.propagate(s);
  }

  @Override
  public Verdict verdict(Store s) {
    Verdict below = atMost.verdict(s);
    if (below == Verdict.FALSE) {
      return below;
    }
    Verdict above = atLeast.verdict(s);
    return above == Verdict.TRUE ? below : above;
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    (why < turn ? atMost : atLeast).explain(s, time, atom, why, out);
  }

  @Override
  public void explainVerdict(Store s, int time, Verdict verdict, Reason out) {
    if (verdict == Verdict.TRUE) {
      atMost.explainVerdict(s, time, verdict, out);
      atLeast.explainVerdict(s, time, verdict, out);
    } else {
      out.unexplained();
    }
  }
}
