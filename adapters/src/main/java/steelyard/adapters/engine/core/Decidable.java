package steelyard.adapters.engine.core;

/** A propagator whose relation can also be judged without being imposed, as conditions need it. */
public interface Decidable extends Propagator {
  /**
   * Subscribes to the events after which {@link #verdict} may be TRUE; {@link #attach} does for
   * FALSE. The same events unless a propagator says otherwise.
   */
  default void attachForTruth(Wiring wiring) {
    attach(wiring);
  }

  /** Whether the relation holds in all, none or some unknown part of the current domains. */
  Verdict verdict(Store s);

  /**
   * Adds to {@code out} atoms that were true before {@code time} and under which the relation holds
   * nowhere ({@code verdict} FALSE) or everywhere (TRUE); it did so at that time.
   */
  default void explainVerdict(Store s, int time, Verdict verdict, Reason out) {
    out.unexplained();
  }
}
