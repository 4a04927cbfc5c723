package steelyard.variants.model.build;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Division;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.Product;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Turns terms into linear sums and views. What is not linear gets an auxiliary variable with a
 * total definition; equal terms of one posting share it. Where a term is partial, the definition is
 * made total and the condition under which the term is defined is handed to the caller.
 */
final class TermFlattener {
  private final Pool pool;
  private final List<Definition> definitions;
  private final Function<Formula, Atom> literal;
  private final Map<Term, View> known = new HashMap<>();

  /**
   * A flattener for one posting.
   *
   * @param definitions gets each definition made
   * @param literal gives the atom that is true where a formula holds
   */
  TermFlattener(Pool pool, List<Definition> definitions, Function<Formula, Atom> literal) {
    this.pool = pool;
    this.definitions = definitions;
    this.literal = literal;
  }

  /** The sum that equals {@code term} where all {@code guards} hold; adds those it needs. */
  LinearSum linear(Term term, List<Atom> guards) {
    SumBuilder sum = new SumBuilder();
    add(1, term, sum, guards);
    return sum.build();
  }

  private void add(long factor, Term term, SumBuilder sum, List<Atom> guards) {
    if (term instanceof Term.Constant constant) {
      sum.addConstant(Math.multiplyExact(factor, constant.value()));
    } else if (term instanceof Term.Sum parts) {
      for (int i = 0; i < parts.terms().size(); i++) {
        long product = Math.multiplyExact(factor, parts.coefficients().get(i));
        add(product, parts.terms().get(i), sum, guards);
      }
    } else if (term instanceof Term.Product product
        && product.left() instanceof Term.Constant constant) {
      add(Math.multiplyExact(factor, constant.value()), product.right(), sum, guards);
    } else if (term instanceof Term.Product product
        && product.right() instanceof Term.Constant constant) {
      add(Math.multiplyExact(factor, constant.value()), product.left(), sum, guards);
    } else {
      sum.add(factor, view(term, guards));
    }
  }

  /** The view that equals {@code term} where all {@code guards} hold; adds those it needs. */
  View view(Term term, List<Atom> guards) {
    if (term instanceof IntVar variable) {
      return variable.view();
    }
    if (term instanceof View view) {
      return view;
    }
    if (isSum(term)) {
      return ofSum(linear(term, guards), Range.of(term, pool), term);
    }
    if (term instanceof Term.Truth truth) {
      return truth(literal.apply(truth.formula()));
    }
    int before = guards.size();
    View found = known.get(term);
    if (found == null) {
      found = define(domain(term, pool), own -> defining(term, own, guards));
      if (guards.size() == before) {
        known.put(term, found);
      }
    }
    return found;
  }

  /** Whether the term is a linear sum of others. */
  private static boolean isSum(Term term) {
    return term instanceof Term.Constant
        || term instanceof Term.Sum
        || (term instanceof Term.Product product
            && (product.left() instanceof Term.Constant
                || product.right() instanceof Term.Constant));
  }

  /** The domain of a variable that equals {@code term}. */
  static Domain domain(Term term, Pool pool) {
    boolean isConstants =
        term instanceof Term.Entry entry
            && entry.array().stream().allMatch(Term.Constant.class::isInstance);
    return isConstants
        ? Domain.of(
            ((Term.Entry) term)
                .array().stream().mapToInt(entry -> (int) ((Term.Constant) entry).value()))
        : Range.of(term, pool).domain(term);
  }

  /** Whether {@link #defining} has a relation of its own for the term. */
  static boolean hasRelation(Term term) {
    return term instanceof Term.Largest
        || term instanceof Term.Smallest
        || term instanceof Term.Absolute
        || term instanceof Term.Quotient
        || term instanceof Term.Remainder
        || term instanceof Term.Entry
        || (term instanceof Term.Product && !isSum(term));
  }

  /** The relation that says {@code own} equals a term for which {@link #hasRelation}. */
  Constraint defining(Term term, View own, List<Atom> guards) {
    if (term instanceof Term.Largest largest) {
      return new Maximum(Views.of(views(largest.terms(), guards)), own);
    }
    if (term instanceof Term.Smallest smallest) {
      return Maximum.minimum(Views.of(views(smallest.terms(), guards)), own);
    }
    if (term instanceof Term.Absolute absolute) {
      return new Absolute(view(absolute.term(), guards), own);
    }
    if (term instanceof Term.Product product) {
      return new Product(number(product.left(), guards), number(product.right(), guards), own);
    }
    if (term instanceof Term.Quotient quotient) {
      View dividend = number(quotient.dividend(), guards);
      return new Division(dividend, divisor(quotient.divisor(), guards), own);
    }
    if (term instanceof Term.Remainder remainder) {
      View dividend = number(remainder.dividend(), guards);
      return new Modulo(dividend, divisor(remainder.divisor(), guards), own);
    }
    return entry((Term.Entry) term, own, guards);
  }

  private Element entry(Term.Entry entry, View own, List<Atom> guards) {
    View index = view(entry.index(), guards);
    Views array = Views.of(views(entry.array(), guards));
    int last = array.size() - 1;
    Range range = Range.of(index, pool);
    if (range.min() < 0) {
      guards.add(index.atLeast(0));
    }
    if (range.max() > last) {
      guards.add(index.atMost(last));
    }
    return new Element(array, clamped(index, last), own);
  }

  /** The view of a term that takes part in a product or quotient: within 10^9. */
  private View number(Term term, List<Atom> guards) {
    View view = view(term, guards);
    Range.of(view, pool).domain(term);
    return view;
  }

  /** The divisor where it is not 0, else 1. */
  private View divisor(Term term, List<Atom> guards) {
    View view = number(term, guards);
    Atom isZero = Unary.simplified(view.is(0), pool);
    if (isZero.equals(Atom.FALSE)) {
      return view;
    }
    guards.add(isZero.negated());
    Range range = Range.of(view, pool);
    if (range.isFixed()) {
      return View.constant(1);
    }
    View usable = truth(isZero.negated());
    return define(
        withoutZero(range), own -> new Element(Views.of(View.constant(1), view), usable, own));
  }

  /** The values of the range other than 0, and 1. */
  private static Domain withoutZero(Range range) {
    int most = (int) Math.max(1, range.max());
    return range.min() < 0
        ? Domain.ofRanges((int) range.min(), -1, 1, most)
        : Domain.between(1, most);
  }

  private List<View> views(List<Term> terms, List<Atom> guards) {
    return terms.stream().map(term -> view(term, guards)).toList();
  }

  private View ofSum(LinearSum sum, Range range, Term term) {
    if (sum.size() == 0 && Math.abs(sum.constant()) <= Domain.LIMIT) {
      return View.constant((int) sum.constant()); // its terms may have cancelled each other
    }
    boolean isView = sum.size() == 1 && Math.abs(sum.coefficient(0)) == 1;
    if (isView && Math.abs(sum.constant()) <= Domain.LIMIT) {
      return new View(sum.variable(0), (int) sum.coefficient(0), (int) sum.constant());
    }
    View found = known.get(term);
    if (found == null) {
      found = define(range.domain(term), own -> equation(sum, own));
      known.put(term, found);
    }
    return found;
  }

  /** {@code sum = own}. */
  static Linear equation(LinearSum sum, View own) {
    SumBuilder difference = new SumBuilder();
    for (int i = 0; i < sum.size(); i++) {
      difference.add(sum.coefficient(i), View.of(sum.variable(i)));
    }
    difference.add(-1, own);
    return Linear.of(difference.build(), Comparison.EQ, -sum.constant());
  }

  /** {@code min(max(index, 0), last)}: the index itself wherever it is inside. */
  private View clamped(View index, int last) {
    View low = index;
    Range range = Range.of(index, pool);
    if (range.min() < 0) {
      Domain domain = Domain.between(0, (int) Math.max(0, range.max()));
      View from = index;
      low = define(domain, own -> new Maximum(Views.of(from, View.constant(0)), own));
    }
    if (range.max() <= last) {
      return low;
    }
    View from = low;
    int least = (int) Math.min(last, Math.max(0, range.min()));
    Domain domain = Domain.between(least, last);
    return define(domain, own -> Maximum.minimum(Views.of(from, View.constant(last)), own));
  }

  /** The view that is 1 where the atom holds, else 0. */
  View truth(Atom atom) {
    if (atom.isConstant()) {
      return View.constant(atom.equals(Atom.TRUE) ? 1 : 0);
    }
    Domain domain = pool.domain(atom.variable());
    if (domain.min() >= 0 && domain.max() <= 1) {
      View itself = View.of(atom.variable());
      return atom.holds(1) == atom.holds(0)
          ? View.constant(atom.holds(1) ? 1 : 0)
          : atom.holds(1) ? itself : itself.negated().shifted(1);
    }
    Relation relation = Clause.of(atom);
    return define(
        Domain.BOOLEAN, own -> new Conditional(own.atLeast(1), Conditional.Mode.IFF, relation));
  }

  /** A new auxiliary variable with the definition that {@code constraint} makes for it. */
  View define(Domain domain, Function<View, Constraint> constraint) {
    int variable = pool.auxiliary(domain);
    View own = View.of(variable);
    definitions.add(new Definition(variable, constraint.apply(own)));
    return own;
  }
}
