package steelyard.adapters.spi;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Table;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** Decompositions of what is said of rows in order. */
final class Sequences {
  private final Definer definer;
  private final Conditions conditions;

  Sequences(Definer definer, Conditions conditions) {
    this.definer = definer;
    this.conditions = conditions;
  }

  /**
   * The state after each position is defined by the state before it and the value there; the last
   * one accepts. A table per position: Quimper &amp; Walsh (2006), "Global Grammar Constraints",
   * CP, LNCS 4204:751-755.
   */
  String regular(Regular relation) {
    Automaton automaton = relation.automaton();
    List<View> letters = relation.word().stream().map(view -> letter(view, automaton)).toList();
    List<Unfolding.Step> steps =
        Unfolding.total(automaton, letters.stream().map(definer::domain).toList());
    View state = View.constant(automaton.start());
    for (int i = 0; i < steps.size(); i++) {
      state = after(state, letters.get(i), steps.get(i));
    }
    // What is left after the last letter is accepted or lost.
    conditions.require(
        steps.isEmpty()
            ? Atom.constant(automaton.accepts(automaton.start()))
            : state.is(Unfolding.sink(automaton)).negated());
    return "transition table per position (Quimper & Walsh 2006)";
  }

  private View after(View state, View letter, Unfolding.Step step) {
    return definer.defined(
        step.states(),
        own -> new Table(Views.of(state, letter, own), step.rows(), Table.Polarity.ALLOWED));
  }

  /** The view; or a variable that joins the values that the automaton does not know, if many. */
  private View letter(View view, Automaton automaton) {
    Ints alphabet = automaton.alphabet();
    Domain values = definer.domain(view);
    int[] known = alphabet.stream().filter(values::contains).toArray();
    if (values.size() <= 2L * known.length + 2) {
      return view;
    }
    int unknown =
        IntStream.rangeClosed(0, alphabet.size())
            .filter(v -> alphabet.stream().noneMatch(letter -> letter == v))
            .findFirst()
            .getAsInt();
    View isKnown = definer.counted(definer.oneOf(view, alphabet));
    Domain letters = Domain.of(IntStream.concat(IntStream.of(known), IntStream.of(unknown)));
    return isKnown.isConstant()
        ? View.constant(unknown)
        : definer.choice(isKnown, view, View.constant(unknown), letters);
  }

  /**
   * From the last position to the first: the rows from there on are in order where left is at most
   * right, and less or else the rest is in order. Frisch, Hnich, Kiziltan, Miguel &amp; Walsh
   * (2006), "Propagation Algorithms for Lexicographic Ordering Constraints", Artificial
   * Intelligence 170(10):803-834.
   */
  String lexicographic(Lexicographic relation) {
    Atom inOrder = Atom.constant(relation.ties() == Lexicographic.Ties.ALLOWED);
    for (int i = relation.left().size() - 1; i >= 0; i--) {
      View left = relation.left().get(i);
      View right = relation.right().get(i);
      LinearSum difference = new Sum().add(1, left).add(-1, right).toLinearSum();
      Atom less = definer.holds(difference, Comparison.LE, -1);
      Atom atMost = definer.holds(difference, Comparison.LE, 0);
      inOrder = definer.all(List.of(atMost, definer.any(List.of(less, inOrder))));
    }
    conditions.require(inOrder);
    return "order from each position on (Frisch et al. 2006)";
  }

  /**
   * A literal for each position and value says that the value stands before the position: Walsh
   * (2006), "Symmetry Breaking Using Value Precedence", ECAI, 168-172.
   */
  String precedence(Precedence relation) {
    for (int k = 1; k < relation.values().size(); k++) {
      int first = relation.values().get(k - 1);
      int then = relation.values().get(k);
      Atom seen = Atom.FALSE;
      for (View view : relation.scope().stream().toList()) {
        conditions.require(view.is(then).negated(), seen);
        seen = definer.any(List.of(seen, view.is(first)));
      }
    }
    return "seen-before literal per position and value (Walsh 2006)";
  }
}
