package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Decompositions of permutations and round tours. A tour is followed node by node: the next node is
 * the entry at this one of the successors, which are 0 here where they are no node.
 */
final class Tours {
  private final Definer definer;
  private final Conditions conditions;

  Tours(Definer definer, Conditions conditions) {
    this.definer = definer;
    this.conditions = conditions;
  }

  /**
   * Where forward leads to j, backward leads back from j: Walsh (2001), "Permutation Problems and
   * Channelling Constraints", LPAR, LNCS 2250:377-391.
   */
  String inverse(Inverse relation) {
    Views forward = relation.forward();
    Views backward = relation.backward();
    for (int i = 0; i < forward.size(); i++) {
      conditions.requireWithin(forward.get(i), backward.size());
      for (int j = 0; j < backward.size(); j++) {
        conditions.require(forward.get(i).is(j).negated(), backward.get(j).is(i));
      }
    }
    conditions.also(new AllDifferent(forward));
    if (forward.size() == backward.size()) {
      conditions.also(new AllDifferent(backward));
    }
    return "channelling literals (Walsh 2001)";
  }

  /**
   * The walk from node 0 is back there after as many steps as there are nodes, and not before. It
   * then has met every node: a walk that comes back for the first time has met none twice.
   */
  String circuit(Circuit relation) {
    Views successors = relation.successors();
    int n = successors.size();
    successors.stream().forEach(view -> conditions.requireWithin(view, n));
    List<View> walk = walk(View.constant(0), successors);
    for (int k = 1; k < n; k++) {
      conditions.require(walk.get(k).is(0).negated());
    }
    if (n > 0) {
      conditions.require(walk.get(n).is(0));
      conditions.also(new AllDifferent(successors));
      conditions.also(new AllDifferent(Views.of(walk.subList(0, n))));
    }
    return "walk along the successors (Lauriere 1978)";
  }

  /**
   * The walk from the first node that is not its own successor comes back there, and meets all the
   * others that are not.
   */
  String subcircuit(Subcircuit relation) {
    Views successors = relation.successors();
    int n = successors.size();
    if (n == 0) {
      return "walk along the successors (Lauriere 1978)";
    }
    successors.stream().forEach(view -> conditions.requireWithin(view, n));
    View start = firstInside(successors);
    List<View> walk = walk(start, successors);
    for (int node = 0; node < n; node++) {
      int at = node;
      List<Atom> outOrMet = new ArrayList<>(List.of(successors.get(node).is(node)));
      walk.subList(0, n).forEach(step -> outOrMet.add(step.is(at)));
      conditions.require(outOrMet);
    }
    conditions.require(
        walk.subList(1, n + 1).stream()
            .map(step -> definer.compare(step, Comparison.EQ, start))
            .toList());
    conditions.also(new AllDifferent(successors));
    return "walk along the successors (Lauriere 1978)";
  }

  /** The first node that is not its own successor; the last node where there is none. */
  private View firstInside(Views successors) {
    int last = successors.size() - 1;
    View first = View.constant(last);
    for (int node = last - 1; node >= 0; node--) {
      View isOut = definer.counted(successors.get(node).is(node));
      if (isOut.isConstant()) {
        first = isOut.offset() == 1 ? first : View.constant(node);
      } else {
        first = definer.choice(isOut, first, View.constant(node), Domain.between(node, last));
      }
    }
    return first;
  }

  /** The nodes met from {@code start} on, one step for each node. */
  private List<View> walk(View start, Views successors) {
    int n = successors.size();
    Views inside = Views.of(successors.stream().map(view -> clamped(view, n)).toList());
    List<View> walk = new ArrayList<>(List.of(start));
    for (int k = 0; k < n; k++) {
      View at = walk.get(k);
      walk.add(
          at.isConstant()
              ? inside.get(at.offset())
              : definer.entry(inside, at, Domain.between(0, n - 1)));
    }
    return walk;
  }

  /** The view where it is one of {@code 0..size-1}, else 0. */
  private View clamped(View view, int size) {
    Atom isInside = definer.all(List.of(view.atLeast(0), view.atMost(size - 1L)));
    if (isInside.equals(Atom.TRUE)) {
      return view;
    }
    if (isInside.equals(Atom.FALSE)) {
      return View.constant(0);
    }
    IntStream values = IntStream.range(0, size).filter(v -> definer.mayBe(view.is(v)));
    Domain domain = Domain.of(IntStream.concat(IntStream.of(0), values));
    return definer.choice(definer.counted(isInside), view, View.constant(0), domain);
  }
}
