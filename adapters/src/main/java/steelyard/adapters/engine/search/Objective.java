package steelyard.adapters.engine.search;

import java.util.OptionalLong;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.propagators.LinearAtMost;
import steelyard.adapters.engine.propagators.Sum;

/** A linear sum to be minimised, as a constraint whose bound each solution lowers. */
public final class Objective {
  private final Network network;
  private final Sum sum;
  private final LinearAtMost better;
  private final int propagator;
  private OptionalLong best = OptionalLong.empty();

  private Objective(Network network, Sum sum, LinearAtMost better, int propagator) {
    this.network = network;
    this.sum = sum;
    this.better = better;
    this.propagator = propagator;
  }

  /** Posts the cut, so far without effect. A maximum is the minimum of the negated sum. */
  public static Objective minimise(Network network, Sum sum, int tag) {
    LinearAtMost better = new LinearAtMost(sum, sum.max(network.store()));
    return new Objective(network, sum, better, network.post(better, tag));
  }

  /** The sum. */
  public Sum sum() {
    return sum;
  }

  /** A lower bound on the sum within the domains; its value if everything is fixed. */
  public long least(Store s) {
    return sum.min(s);
  }

  /** From now on only values below the current one will do. */
  void improve(Store s) {
    long value = sum.min(s);
    best = OptionalLong.of(value);
    better.tightenTo(value - 1);
  }

  /** The value of the last solution. */
  OptionalLong best() {
    return best;
  }

  /** Has the cut looked at again: at nodes before the last solution it was weaker. */
  void wake() {
    network.wake(propagator);
  }
}
