package steelyard.variants.model;

import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Objects;
import java.util.stream.Collectors;

/**
 * An integer expression, kept as written. Sums and products are exact: what could pass 2^62 - 1 is
 * refused when it is posted. An {@link Entry} is partial: outside its array it is undefined; so are
 * {@link Quotient} and {@link Remainder} where the divisor is 0. The nearest formula around what is
 * undefined is false (relational semantics).
 *
 * <pre>{@code
 * Term rows = tiles.plus(perRow).minus(1).dividedBy(perRow);   // rounded up, tiles being positive
 * draft.group("on the hour").post(start.remainder(60).eq(0));
 * draft.group("few high firings").post(Term.count(programs, 4, 5).le(3));
 * }</pre>
 */
public sealed interface Term
    permits IntVar,
        View,
        Term.Constant,
        Term.Sum,
        Term.Largest,
        Term.Smallest,
        Term.Absolute,
        Term.Product,
        Term.Quotient,
        Term.Remainder,
        Term.Entry,
        Term.Truth {

  /** A constant. */
  record Constant(long value) implements Term {
    @Override
    public String toString() {
      return Long.toString(value);
    }
  }

  /** Σ coefficients[i]·terms[i]. */
  record Sum(List<Term> terms, Longs coefficients) implements Term {
    public Sum {
      terms = List.copyOf(terms);
      if (terms.size() != coefficients.size()) {
        throw new IllegalArgumentException(
            terms.size() + " terms with " + coefficients.size() + " coefficients");
      }
    }

    @Override
    public String toString() {
      StringBuilder text = new StringBuilder("(");
      for (int i = 0; i < terms.size(); i++) {
        long a = coefficients.get(i);
        text.append(i == 0 ? (a < 0 ? "-" : "") : a < 0 ? " - " : " + ");
        text.append(Math.abs(a) == 1 ? "" : Math.abs(a) + "*").append(terms.get(i));
      }
      return text.append(')').toString();
    }
  }

  /** The largest of at least one term. */
  record Largest(List<Term> terms) implements Term {
    public Largest {
      terms = nonEmpty(terms, "max");
    }

    @Override
    public String toString() {
      return call("max", terms);
    }
  }

  /** The smallest of at least one term. */
  record Smallest(List<Term> terms) implements Term {
    public Smallest {
      terms = nonEmpty(terms, "min");
    }

    @Override
    public String toString() {
      return call("min", terms);
    }
  }

  /** The magnitude. */
  record Absolute(Term term) implements Term {
    public Absolute {
      Objects.requireNonNull(term, "term");
    }

    @Override
    public String toString() {
      return "abs(" + term + ")";
    }
  }

  /** {@code left * right}. */
  record Product(Term left, Term right) implements Term {
    public Product {
      Objects.requireNonNull(left, "left");
      Objects.requireNonNull(right, "right");
    }

    @Override
    public String toString() {
      return left + " * " + right;
    }
  }

  /** {@code dividend / divisor} rounded toward 0, as in Java; undefined where the divisor is 0. */
  record Quotient(Term dividend, Term divisor) implements Term {
    public Quotient {
      Objects.requireNonNull(dividend, "dividend");
      Objects.requireNonNull(divisor, "divisor");
    }

    @Override
    public String toString() {
      return "(" + dividend + " / " + divisor + ")";
    }
  }

  /**
   * What {@link Quotient} leaves: {@code dividend % divisor}, of the dividend's sign, as in Java;
   * undefined where the divisor is 0.
   */
  record Remainder(Term dividend, Term divisor) implements Term {
    public Remainder {
      Objects.requireNonNull(dividend, "dividend");
      Objects.requireNonNull(divisor, "divisor");
    }

    @Override
    public String toString() {
      return "(" + dividend + " % " + divisor + ")";
    }
  }

  /** {@code array[index]}, from 0; undefined outside the array. */
  record Entry(List<Term> array, Term index) implements Term {
    public Entry {
      array = nonEmpty(array, "an array");
      Objects.requireNonNull(index, "index");
    }

    @Override
    public String toString() {
      return array + "[" + index + "]";
    }
  }

  /** 1 where the formula holds, else 0. */
  record Truth(Formula formula) implements Term {
    public Truth {
      Objects.requireNonNull(formula, "formula");
    }

    @Override
    public String toString() {
      return "[" + formula + "]";
    }
  }

  private static List<Term> nonEmpty(List<Term> terms, String what) {
    if (terms.isEmpty()) {
      throw new IllegalArgumentException(what + " of nothing");
    }
    return List.copyOf(terms);
  }

  private static String call(String name, List<Term> terms) {
    return terms.stream().map(Object::toString).collect(Collectors.joining(", ", name + "(", ")"));
  }

  static Term constant(long value) {
    return new Constant(value);
  }

  static Term sum(Term... terms) {
    return sum(Arrays.asList(terms));
  }

  static Term sum(Collection<? extends Term> terms) {
    long[] ones = new long[terms.size()];
    Arrays.fill(ones, 1);
    return new Sum(List.copyOf(terms), Longs.of(ones));
  }

  /** Σ coefficients[i]·terms[i]. */
  static Term scalar(Collection<? extends Term> terms, long... coefficients) {
    return new Sum(List.copyOf(terms), Longs.of(coefficients));
  }

  static Term max(Term... terms) {
    return new Largest(Arrays.asList(terms));
  }

  static Term max(Collection<? extends Term> terms) {
    return new Largest(List.copyOf(terms));
  }

  static Term min(Term... terms) {
    return new Smallest(Arrays.asList(terms));
  }

  static Term min(Collection<? extends Term> terms) {
    return new Smallest(List.copyOf(terms));
  }

  static Term abs(Term term) {
    return new Absolute(term);
  }

  /** {@code array[index]}, from 0. */
  static Term at(Collection<? extends Term> array, Term index) {
    return new Entry(List.copyOf(array), index);
  }

  /** {@code constants[index]}, from 0. */
  static Term at(Ints constants, Term index) {
    return new Entry(constants.stream().<Term>mapToObj(Constant::new).toList(), index);
  }

  /** How many of the terms have one of {@code values}; a term that is undefined has none. */
  static Term count(Collection<? extends Term> terms, long... values) {
    return sum(
        terms.stream()
            .map(term -> truth(Formula.any(Arrays.stream(values).mapToObj(term::eq).toList())))
            .toList());
  }

  /** 1 where the formula holds, else 0. */
  static Term truth(Formula formula) {
    return new Truth(formula);
  }

  default Term plus(Term other) {
    return new Sum(List.of(this, other), Longs.of(1, 1));
  }

  default Term plus(long value) {
    return plus(constant(value));
  }

  default Term minus(Term other) {
    return new Sum(List.of(this, other), Longs.of(1, -1));
  }

  default Term minus(long value) {
    return new Sum(List.of(this, constant(value)), Longs.of(1, -1));
  }

  default Term times(long factor) {
    return new Sum(List.of(this), Longs.of(factor));
  }

  default Term times(Term other) {
    return new Product(this, other);
  }

  /** This divided by {@code divisor}, rounded toward 0; undefined where it is 0. */
  default Term dividedBy(Term divisor) {
    return new Quotient(this, divisor);
  }

  /** This divided by {@code divisor}, rounded toward 0. */
  default Term dividedBy(long divisor) {
    return dividedBy(constant(divisor));
  }

  /** What division by {@code divisor} leaves, of this term's sign; undefined where it is 0. */
  default Term remainder(Term divisor) {
    return new Remainder(this, divisor);
  }

  /** What division by {@code divisor} leaves, of this term's sign. */
  default Term remainder(long divisor) {
    return remainder(constant(divisor));
  }

  default Term negated() {
    return times(-1);
  }

  default Formula le(Term other) {
    return new Formula.Compare(this, Comparison.LE, other);
  }

  default Formula le(long value) {
    return le(constant(value));
  }

  default Formula lt(Term other) {
    return plus(1).le(other);
  }

  default Formula lt(long value) {
    return le(value - 1);
  }

  default Formula ge(Term other) {
    return new Formula.Compare(this, Comparison.GE, other);
  }

  default Formula ge(long value) {
    return ge(constant(value));
  }

  default Formula gt(Term other) {
    return other.lt(this);
  }

  default Formula gt(long value) {
    return ge(value + 1);
  }

  default Formula eq(Term other) {
    return new Formula.Compare(this, Comparison.EQ, other);
  }

  default Formula eq(long value) {
    return eq(constant(value));
  }

  default Formula ne(Term other) {
    return new Formula.Compare(this, Comparison.NE, other);
  }

  default Formula ne(long value) {
    return ne(constant(value));
  }
}
