package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.LongStream;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Division;
import steelyard.variants.model.Domain;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.Product;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Decompositions of arithmetic. A product is linear under each value of a factor that has few; else
 * one factor is written in binary, and each of its digits chooses a multiple of the other: shift
 * and add, as in Tamura, Tanjo &amp; Banbara (2012), "Azucar: A SAT-Based CSP Solver Using Compact
 * Order Encoding", SAT, LNCS 7317:456-462.
 */
final class Arithmetic {
  /** A factor of so many values is taken value by value. */
  private static final int FEW = 16;

  private final Definer definer;
  private final Conditions conditions;

  Arithmetic(Definer definer, Conditions conditions) {
    this.definer = definer;
    this.conditions = conditions;
  }

  /** The result is at least every term, and at most one of them. */
  String maximum(Maximum relation) {
    List<View> terms = relation.terms().stream().toList();
    View result = relation.result();
    terms.forEach(term -> conditions.require(term, Comparison.LE, result));
    conditions.require(terms.stream().map(t -> definer.compare(t, Comparison.GE, result)).toList());
    return "at least every term, at most one";
  }

  /** The larger of the operand and its negative. */
  String absolute(Absolute relation) {
    Views both = Views.of(relation.operand(), relation.operand().negated());
    maximum(new Maximum(both, relation.result()));
    return "larger of the operand and its negative";
  }

  String product(Product relation) {
    boolean leftIsSmaller =
        definer.domain(relation.left()).size() < definer.domain(relation.right()).size();
    View small = leftIsSmaller ? relation.left() : relation.right();
    View other = leftIsSmaller ? relation.right() : relation.left();
    if (definer.domain(small).size() <= FEW) {
      definer.domain(small).stream()
          .forEach(
              v -> {
                Sum difference = new Sum().add(v, other).add(-1, relation.result());
                Atom elsewhere = small.is(v).negated();
                conditions.require(difference.toLinearSum(), Comparison.EQ, 0, elsewhere);
              });
      return "linear per value of a factor";
    }
    Sum difference = product(small, other).add(-1, relation.result());
    conditions.require(difference.toLinearSum(), Comparison.EQ, 0);
    return "shift and add (Tamura et al. 2012)";
  }

  /** A sum that is always {@code a * b}. */
  private Sum product(View a, View b) {
    if (a.isConstant() || b.isConstant()) {
      return a.isConstant() ? new Sum().add(a.offset(), b) : new Sum().add(b.offset(), a);
    }
    boolean isNarrower = span(a) < span(b);
    View digits = isNarrower ? a : b;
    View other = isNarrower ? b : a;
    Sum product = new Sum().add(definer.min(digits), other);
    List<Atom> binary = binary(digits);
    for (int k = 0; k < binary.size(); k++) {
      definer.addWhere(binary.get(k), 1L << k, other, product);
    }
    return product;
  }

  private long span(View view) {
    return definer.max(view) - definer.min(view);
  }

  /** The binary digits of {@code view - min}, the lowest first. */
  private List<Atom> binary(View view) {
    List<Atom> digits = new ArrayList<>();
    Sum rest = new Sum().add(1, view).add(-definer.min(view), View.constant(1));
    for (int k = Long.SIZE - 1 - Long.numberOfLeadingZeros(span(view)); k >= 0; k--) {
      Atom digit = definer.holds(rest.toLinearSum(), Comparison.GE, 1L << k);
      digits.add(0, digit);
      rest.add(-(1L << k), definer.counted(digit));
    }
    return digits;
  }

  /**
   * What the quotient leaves of the dividend, {@code d = dividend - divisor * quotient}, has the
   * dividend's sign and is less than the divisor: the definition of division rounded toward 0 in
   * the Java Language Specification, 15.17.2.
   */
  String division(Division relation) {
    View x = relation.dividend();
    View y = relation.divisor();
    Sum left = new Sum().add(1, x).add(-1, product(relation.quotient(), y));
    conditions.require(y.is(0).negated());
    Atom negative = x.atMost(-1);
    Atom positive = x.atLeast(1);
    conditions.require(left.toLinearSum(), Comparison.GE, 0, negative);
    conditions.require(plus(left, y), Comparison.LE, -1, negative, y.atLeast(0));
    conditions.require(plus(left, y.negated()), Comparison.LE, -1, negative, y.atMost(0));
    conditions.require(left.toLinearSum(), Comparison.LE, 0, positive);
    conditions.require(plus(left, y), Comparison.GE, 1, positive, y.atMost(0));
    conditions.require(plus(left, y.negated()), Comparison.GE, 1, positive, y.atLeast(0));
    return "dividend less divisor times quotient is a remainder";
  }

  private static LinearSum plus(Sum sum, View view) {
    return new Sum().add(1, sum).add(1, view).toLinearSum();
  }

  /** The quotient is defined, of a divisor that is 1 where it would be 0. */
  String modulo(Modulo relation) {
    View x = relation.dividend();
    View y = divisor(relation.divisor());
    View quotient = definer.defined(quotients(x, y), own -> new Division(x, y, own));
    Sum difference = new Sum().add(1, x).add(-1, product(quotient, y));
    difference.add(-1, relation.remainder());
    conditions.require(relation.divisor().is(0).negated());
    conditions.require(difference.toLinearSum(), Comparison.EQ, 0);
    return "dividend less divisor times defined quotient";
  }

  /** The view where it is not 0, else 1. */
  private View divisor(View view) {
    Domain values = definer.domain(view);
    if (!values.contains(0)) {
      return view;
    }
    if (values.isFixed()) {
      return View.constant(1);
    }
    View isUsable = definer.counted(view.is(0).negated());
    Domain usable = Domains.with(1, Domains.without(0, values));
    return definer.choice(isUsable, view, View.constant(1), usable);
  }

  /** A quotient is largest in magnitude where the divisor is closest to 0. */
  private Domain quotients(View x, View y) {
    long[] divisors =
        LongStream.of(definer.min(y), -1, 1, definer.max(y))
            .filter(d -> d != 0 && d >= definer.min(y) && d <= definer.max(y))
            .toArray();
    long[] corners =
        LongStream.of(divisors)
            .flatMap(d -> LongStream.of(definer.min(x) / d, definer.max(x) / d))
            .sorted()
            .toArray();
    return Domain.between((int) corners[0], (int) corners[corners.length - 1]);
  }
}
