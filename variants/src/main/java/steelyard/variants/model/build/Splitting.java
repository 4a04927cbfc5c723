package steelyard.variants.model.build;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/** Ways to take formulas apart that cost no auxiliary variable. */
final class Splitting {
  private Splitting() {}

  /**
   * {@code max(..) <= r} as every part at most r, and its three mirror images; a magnitude is the
   * larger of a term and its negative.
   */
  static Optional<Formula> ofExtreme(Formula.Compare compare) {
    Term left = compare.left();
    Term right = compare.right();
    boolean atMost = compare.op() == Comparison.LE;
    if (!atMost && compare.op() != Comparison.GE) {
      return Optional.empty();
    }
    if (atMost && left instanceof Term.Largest largest) {
      return Optional.of(Formula.all(largest.terms().stream().map(t -> t.le(right)).toList()));
    }
    if (atMost && left instanceof Term.Absolute absolute) {
      return Optional.of(absolute.term().le(right).and(absolute.term().negated().le(right)));
    }
    if (!atMost && right instanceof Term.Absolute absolute) {
      return Optional.of(left.ge(absolute.term()).and(left.ge(absolute.term().negated())));
    }
    if (!atMost && left instanceof Term.Smallest smallest) {
      return Optional.of(Formula.all(smallest.terms().stream().map(t -> t.ge(right)).toList()));
    }
    if (atMost && right instanceof Term.Smallest smallest) {
      return Optional.of(Formula.all(smallest.terms().stream().map(left::le).toList()));
    }
    if (!atMost && right instanceof Term.Largest largest) {
      return Optional.of(Formula.all(largest.terms().stream().map(left::ge).toList()));
    }
    return Optional.empty();
  }

  /** The parts, negated unless wanted, with disjunctions inside them joined to them. */
  static List<Formula> disjuncts(List<Formula> parts, boolean wanted) {
    return parts.stream().flatMap(part -> disjuncts(part, wanted)).toList();
  }

  private static Stream<Formula> disjuncts(Formula part, boolean wanted) {
    if (part instanceof Formula.Not not) {
      return disjuncts(not.part(), !wanted);
    }
    if (part instanceof Formula.Any any && wanted) {
      return any.parts().stream().flatMap(inner -> disjuncts(inner, true));
    }
    if (part instanceof Formula.All all && !wanted) {
      return all.parts().stream().flatMap(inner -> disjuncts(inner, false));
    }
    return Stream.of(wanted ? part : part.not());
  }

  /** Whether both sides are sums of variables: no auxiliary, nothing undefined. */
  static boolean isLinear(Formula.Compare compare) {
    return isLinear(compare.left()) && isLinear(compare.right());
  }

  /** Whether the term is a sum of variables. */
  static boolean isLinear(Term term) {
    return term instanceof IntVar
        || term instanceof View
        || term instanceof Term.Constant
        || (term instanceof Term.Sum sum && sum.terms().stream().allMatch(Splitting::isLinear));
  }
}
