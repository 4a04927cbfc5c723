package steelyard.adapters.cpsat;

import java.util.function.IntToLongFunction;
import steelyard.variants.model.Ints;

/** Reads the values of a model's decisions from a solution of the library. */
final class Decisions {
  private final int[] places;

  Decisions(Instance instance) {
    Ints decisions = instance.model().variables().decisions();
    this.places = decisions.stream().map(instance.places()::of).toArray();
  }

  /** Values in the order of the model's decisions. */
  int[] at(IntToLongFunction byPlace) {
    int[] values = new int[places.length];
    for (int i = 0; i < values.length; i++) {
      values[i] = Math.toIntExact(byPlace.applyAsLong(places[i]));
    }
    return values;
  }
}
