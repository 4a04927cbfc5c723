package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.DecisionStrategyProto;
import com.google.ortools.sat.DecisionStrategyProto.DomainReductionStrategy;
import com.google.ortools.sat.DecisionStrategyProto.VariableSelectionStrategy;
import com.google.ortools.sat.PartialVariableAssignment;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Hint;
import steelyard.variants.model.View;

/** A model's branching and hint in the library's terms. */
final class SearchGuide {
  /** Beyond this size the library refuses to search from the middle of a domain. */
  private static final long MEDIAN_LIMIT = 100_000;

  private final Places places;

  SearchGuide(Places places) {
    this.places = places;
  }

  /**
   * Adds the phases up to the first by weighted degree, which the library does not have: from there
   * on its own search decides. Answers how many are followed.
   */
  int follow(Branching branching, CpModelProto.Builder message) {
    int followed = 0;
    for (Branching.Phase phase : branching.phases()) {
      Optional<VariableSelectionStrategy> order = order(phase.by());
      if (order.isEmpty()) {
        return followed;
      }
      followed++;
      List<View> open = phase.views().stream().filter(view -> !view.isConstant()).toList();
      if (!open.isEmpty()) {
        DecisionStrategyProto.Builder strategy = message.addSearchStrategyBuilder();
        open.forEach(view -> strategy.addExprs(places.expression(view)));
        strategy.setVariableSelectionStrategy(order.get());
        strategy.setDomainReductionStrategy(pick(phase.pick(), open));
      }
    }
    return followed;
  }

  private static Optional<VariableSelectionStrategy> order(Branching.VariableOrder by) {
    return switch (by) {
      case INPUT -> Optional.of(VariableSelectionStrategy.CHOOSE_FIRST);
      case SMALLEST_DOMAIN -> Optional.of(VariableSelectionStrategy.CHOOSE_MIN_DOMAIN_SIZE);
      case LARGEST_DOMAIN -> Optional.of(VariableSelectionStrategy.CHOOSE_MAX_DOMAIN_SIZE);
      case SMALLEST_MIN -> Optional.of(VariableSelectionStrategy.CHOOSE_LOWEST_MIN);
      case LARGEST_MAX -> Optional.of(VariableSelectionStrategy.CHOOSE_HIGHEST_MAX);
      case WEIGHTED_DEGREE -> Optional.empty();
    };
  }

  private DomainReductionStrategy pick(Branching.ValueOrder pick, List<View> views) {
    return switch (pick) {
      case MIN -> DomainReductionStrategy.SELECT_MIN_VALUE;
      case MAX -> DomainReductionStrategy.SELECT_MAX_VALUE;
      case LOWER_HALF -> DomainReductionStrategy.SELECT_LOWER_HALF;
      case UPPER_HALF -> DomainReductionStrategy.SELECT_UPPER_HALF;
      case MEDIAN ->
          views.stream().allMatch(v -> places.domain(v.variable()).size() <= MEDIAN_LIMIT)
              ? DomainReductionStrategy.SELECT_MEDIAN_VALUE
              : DomainReductionStrategy.SELECT_LOWER_HALF;
    };
  }

  /** Adds the hinted values, and those of the literals that they decide. */
  void hint(Hint hint, Literals literals, CpModelProto.Builder message) {
    Map<Integer, Integer> hinted = new HashMap<>();
    PartialVariableAssignment.Builder values = PartialVariableAssignment.newBuilder();
    for (int i = 0; i < hint.size(); i++) {
      int variable = hint.variables().get(i);
      int value = hint.values().get(i);
      if (places.has(variable) && places.domain(variable).contains(value)) {
        hinted.put(variable, value);
        values.addVars(places.of(variable)).addValues(value);
      }
    }
    literals.forEachMade(
        (Atom atom, int literal) -> {
          Integer value = hinted.get(atom.variable());
          if (value != null) {
            values.addVars(literal).addValues(atom.holds(value) ? 1 : 0);
          }
        });
    if (values.getVarsCount() > 0) {
      message.setSolutionHint(values);
    }
  }
}
