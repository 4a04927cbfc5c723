package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Table;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Decompositions that only say that a relation holds: smaller, or stronger, than what could also
 * say that it does not. Their fresh variables have one value each in every solution, and may have
 * none elsewhere.
 */
final class Posted {
  private final Fresh fresh;
  private final Definer definer;
  private final Conditions conditions;

  private Posted(Fresh fresh) {
    this.fresh = fresh;
    definer = new Definer(fresh);
    conditions = new Conditions(definer);
  }

  /** Empty where the kind has no such decomposition. */
  static Optional<Reduction> of(Relation relation, Fresh fresh) {
    Posted it = new Posted(fresh);
    if (relation instanceof Regular regular) {
      return Optional.of(it.reduction(it.regular(regular)));
    }
    return relation instanceof Circuit circuit
        ? Optional.of(it.reduction(it.circuit(circuit)))
        : Optional.empty();
  }

  private Reduction reduction(String how) {
    return new Reduction(
        how, definer.definitions(), conditions.under(Atom.TRUE, Conditional.Mode.IF));
  }

  /**
   * A table per position, of the states that lead to acceptance only: Quimper &amp; Walsh (2006),
   * "Global Grammar Constraints", CP, LNCS 4204:751-755.
   */
  private String regular(Regular relation) {
    Automaton automaton = relation.automaton();
    Optional<List<Domain>> letters = letters(relation.word(), automaton);
    Optional<List<Unfolding.Step>> steps =
        letters.flatMap(known -> Unfolding.accepted(automaton, known));
    if (steps.isEmpty()) {
      conditions.require(Atom.FALSE);
    } else {
      View state = View.constant(automaton.start());
      for (int i = 0; i < relation.word().size(); i++) {
        Unfolding.Step step = steps.get().get(i);
        View next = View.of(fresh.variable(step.states()));
        Views scope = Views.of(state, relation.word().get(i), next);
        conditions.also(new Table(scope, step.rows(), Table.Polarity.ALLOWED));
        state = next;
      }
    }
    return "transition table per position (Quimper & Walsh 2006)";
  }

  /** By position, the letters that the automaton knows; none where a position has none. */
  private Optional<List<Domain>> letters(Views word, Automaton automaton) {
    List<Domain> letters = new ArrayList<>();
    for (int i = 0; i < word.size(); i++) {
      Domain values = definer.domain(word.get(i));
      int[] known = automaton.alphabet().stream().filter(values::contains).toArray();
      if (known.length == 0) {
        return Optional.empty();
      }
      letters.add(Domain.of(known));
    }
    return Optional.of(letters);
  }

  /**
   * A node's position on the tour is one more than that of the node before it; node 0 has position
   * 0. Miller, Tucker &amp; Zemlin (1960), "Integer Programming Formulation of Traveling Salesman
   * Problems", Journal of the ACM 7(4):326-329.
   */
  private String circuit(Circuit relation) {
    Views successors = relation.successors();
    int n = successors.size();
    List<View> positions =
        IntStream.range(0, n)
            .mapToObj(
                i -> i == 0 ? View.constant(0) : View.of(fresh.variable(Domain.between(1, n - 1))))
            .toList();
    for (int i = 0; i < n; i++) {
      View next = successors.get(i);
      conditions.requireWithin(next, n);
      conditions.require(
          positions.get(i), Comparison.EQ, View.constant(n - 1), next.is(0).negated());
      for (int j = 1; j < n; j++) {
        View after = positions.get(i).shifted(1);
        conditions.require(positions.get(j), Comparison.EQ, after, next.is(j).negated());
      }
    }
    conditions.also(new AllDifferent(successors));
    conditions.also(new AllDifferent(Views.of(positions)));
    return "position variables (Miller, Tucker & Zemlin 1960)";
  }
}
