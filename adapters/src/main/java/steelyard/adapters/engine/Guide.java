package steelyard.adapters.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.search.Automatic;
import steelyard.adapters.engine.search.Brancher;
import steelyard.adapters.engine.search.Objective;
import steelyard.adapters.engine.search.Ordered;
import steelyard.adapters.engine.search.Phases;
import steelyard.adapters.engine.search.ValueOrder;
import steelyard.adapters.engine.search.VariableOrder;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Hint;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.Views;

/**
 * Makes the search follow the model: its branching phase by phase, and for what they leave open the
 * automatic order, which goes towards the hint.
 */
final class Guide {
  private final Network network;
  private final Places places;
  private final Branching branching;
  private final Hint hint;
  private final long seed;

  /**
   * A guide by the model's wishes.
   *
   * @param follow whether to follow its branching
   * @param seed shuffles ties between variables
   */
  Guide(Network network, Places places, Model model, boolean follow, long seed) {
    this.network = network;
    this.places = places;
    this.branching = follow ? model.branching() : Branching.NONE;
    this.hint = model.hint();
    this.seed = seed;
  }

  /** Whether the model says how to search. */
  boolean isModels() {
    return !branching.isEmpty();
  }

  /** Decides everything. */
  Brancher everything(Optional<Objective> objective) {
    List<Brancher> branchers = phases(variable -> true);
    branchers.add(hinted(new Automatic(network, objective, seed)));
    return new Phases(branchers);
  }

  /** Decides the variables, in the order of the branching as far as it mentions them. */
  Brancher only(Ints variables) {
    boolean[] wanted = new boolean[places.fresh().size()];
    variables.stream().forEach(v -> wanted[v] = true);
    List<Brancher> branchers = phases(v -> wanted[v]);
    branchers.add(hinted(new Automatic(network, places.scope(variables), Optional.empty(), seed)));
    return new Phases(branchers);
  }

  private Automatic hinted(Automatic automatic) {
    for (int i = 0; i < hint.size(); i++) {
      if (places.has(hint.variables().get(i))) {
        automatic.suggesting(places.handle(hint.variables().get(i)), hint.values().get(i));
      }
    }
    return automatic;
  }

  private List<Brancher> phases(IntPredicate wanted) {
    List<Brancher> phases = new ArrayList<>();
    for (Branching.Phase phase : branching.phases()) {
      Views views = phase.views();
      int[] rows =
          IntStream.range(0, views.size())
              .filter(i -> !views.isConstant(i) && wanted.test(views.variable(i)))
              .toArray();
      Scope scope = places.scope(views.permuted(rows));
      phases.add(new Ordered(network, scope, order(phase.by()), order(phase.pick()), seed));
    }
    return phases;
  }

  private static VariableOrder order(Branching.VariableOrder by) {
    return switch (by) {
      case INPUT -> VariableOrder.INPUT;
      case SMALLEST_DOMAIN -> VariableOrder.SMALLEST_DOMAIN;
      case LARGEST_DOMAIN -> VariableOrder.LARGEST_DOMAIN;
      case SMALLEST_MIN -> VariableOrder.SMALLEST_MIN;
      case LARGEST_MAX -> VariableOrder.LARGEST_MAX;
      case WEIGHTED_DEGREE -> VariableOrder.WEIGHTED_DEGREE;
    };
  }

  private static ValueOrder order(Branching.ValueOrder pick) {
    return switch (pick) {
      case MIN -> ValueOrder.MIN;
      case MAX -> ValueOrder.MAX;
      case MEDIAN -> ValueOrder.MEDIAN;
      case LOWER_HALF -> ValueOrder.LOWER_HALF;
      case UPPER_HALF -> ValueOrder.UPPER_HALF;
    };
  }
}
