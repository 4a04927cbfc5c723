package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Propagator;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code when ⇒ body}: the body is imposed once the condition is true, and the condition becomes
 * false once the body cannot hold.
 *
 * <p>Strength: the body's own while the condition is true; before that, as good as its verdict.
 * Cost: the body's.
 */
public final class Implied implements Propagator {
  private static final int REFUTED = Integer.MIN_VALUE;

  private final long when;
  private final Decidable body;

  /** {@code when ⇒ body}. */
  public Implied(long when, Decidable body) {
    this.when = when;
    this.body = body;
  }

  @Override
  public int cost() {
    return body.cost();
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAtom(when);
    body.attach(wiring);
  }

  @Override
  public boolean propagate(Store s) {
    int truth = s.truth(when);
    if (truth > 0) {
      return body.propagate(s);
    }
    Verdict verdict = truth < 0 ? Verdict.TRUE : body.verdict(s);
    if (verdict == Verdict.TRUE) {
      s.entail();
    }
    return verdict != Verdict.FALSE || s.require(Atom.not(when), REFUTED);
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    if (why == REFUTED) {
      body.explainVerdict(s, time, Verdict.FALSE, out);
    } else {
      body.explain(s, time, atom, why, out);
      out.add(when);
    }
  }
}
