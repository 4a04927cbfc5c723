package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Propagator;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code body ⇒ then}: the atom becomes true once the body holds whatever else happens.
 *
 * <p>Strength: as good as the body's verdict, and nothing is removed from the body's scope; exact
 * at full assignment. Cost: the body's. Relations whose negation is a relation of ours are posted
 * as {@link Implied} of the negation instead, which removes more.
 */
public final class Entails implements Propagator {
  private final Decidable body;
  private final long then;

  /** {@code body ⇒ then}. */
  public Entails(Decidable body, long then) {
    this.body = body;
    this.then = then;
  }

  @Override
  public int cost() {
    return body.cost();
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAtom(then);
    body.attachForTruth(wiring);
  }

  @Override
  public boolean propagate(Store s) {
    Verdict verdict = s.truth(then) > 0 ? Verdict.FALSE : body.verdict(s);
    if (verdict == Verdict.FALSE) {
      s.entail();
    }
    return verdict != Verdict.TRUE || s.require(then, 0);
  }

  @Override
  public void explain(Store s, int time, long atom, int why, Reason out) {
    body.explainVerdict(s, time, Verdict.TRUE, out);
  }
}
