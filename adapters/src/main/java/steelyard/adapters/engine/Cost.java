package steelyard.adapters.engine;

import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.search.Objective;
import steelyard.variants.model.Objective.Sense;

/** The model's objective as the engine sees it: minimised, and without the constant. */
record Cost(steelyard.variants.model.Objective objective) {

  private boolean isTurned() {
    return objective.sense() == Sense.MAXIMIZE;
  }

  Objective minimise(Network network, Places places, int tag) {
    var sum = places.sum(objective.sum());
    return Objective.minimise(network, isTurned() ? sum.negated() : sum, tag);
  }

  /** The model's objective where the engine's is {@code inner}. */
  long outer(long inner) {
    return (isTurned() ? -inner : inner) + objective.sum().constant();
  }
}
