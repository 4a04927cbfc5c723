package steelyard.variants.model.build;

import java.util.Collection;
import java.util.List;
import java.util.function.LongSupplier;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/** Smallest and largest value that a term can take; exact for its parts, not for their ties. */
record Range(long min, long max) {

  Range {
    if (min > max) {
      throw new IllegalArgumentException("empty range " + min + ".." + max);
    }
  }

  /**
   * The range of {@code term} over the domains of {@code pool}.
   *
   * @throws ModelException if a sum can pass 2^62 - 1 in magnitude
   */
  static Range of(Term term, Pool pool) {
    if (term instanceof IntVar variable) {
      Domain domain = pool.domain(variable.id());
      return new Range(domain.min(), domain.max());
    }
    if (term instanceof View view) {
      return of(view, pool);
    }
    if (term instanceof Term.Constant constant) {
      return new Range(constant.value(), constant.value());
    }
    if (term instanceof Term.Sum sum) {
      return of(sum, pool);
    }
    if (term instanceof Term.Largest largest) {
      List<Range> parts = of(largest.terms(), pool);
      return new Range(
          parts.stream().mapToLong(Range::min).max().orElseThrow(),
          parts.stream().mapToLong(Range::max).max().orElseThrow());
    }
    if (term instanceof Term.Smallest smallest) {
      List<Range> parts = of(smallest.terms(), pool);
      return new Range(
          parts.stream().mapToLong(Range::min).min().orElseThrow(),
          parts.stream().mapToLong(Range::max).min().orElseThrow());
    }
    if (term instanceof Term.Absolute absolute) {
      return of(absolute.term(), pool).magnitude();
    }
    if (term instanceof Term.Product product) {
      Range left = of(product.left(), pool);
      return product.left().equals(product.right())
          ? left.squared()
          : left.times(of(product.right(), pool));
    }
    if (term instanceof Term.Quotient quotient) {
      return of(quotient.dividend(), pool).dividedBy(of(quotient.divisor(), pool));
    }
    if (term instanceof Term.Remainder remainder) {
      return of(remainder.dividend(), pool).remainder(of(remainder.divisor(), pool));
    }
    if (term instanceof Term.Entry entry) {
      List<Range> parts = of(entry.array(), pool);
      return new Range(
          parts.stream().mapToLong(Range::min).min().orElseThrow(),
          parts.stream().mapToLong(Range::max).max().orElseThrow());
    }
    return new Range(0, 1);
  }

  private static List<Range> of(Collection<Term> terms, Pool pool) {
    return terms.stream().map(term -> of(term, pool)).toList();
  }

  private static Range of(View view, Pool pool) {
    if (view.isConstant()) {
      return new Range(view.offset(), view.offset());
    }
    Domain domain = pool.domain(view.variable());
    int a = view.apply(domain.min());
    int b = view.apply(domain.max());
    return new Range(Math.min(a, b), Math.max(a, b));
  }

  private static Range of(Term.Sum sum, Pool pool) {
    Range total = new Range(0, 0);
    for (int i = 0; i < sum.terms().size(); i++) {
      total = total.plus(of(sum.terms().get(i), pool).times(sum.coefficients().get(i)));
    }
    return total;
  }

  static Range of(LinearSum sum, Pool pool) {
    Range total = new Range(sum.constant(), sum.constant());
    for (int i = 0; i < sum.size(); i++) {
      Domain domain = pool.domain(sum.variable(i));
      total = total.plus(new Range(domain.min(), domain.max()).times(sum.coefficient(i)));
    }
    return total;
  }

  Range plus(Range other) {
    return new Range(
        limited(exact(() -> Math.addExact(min, other.min))),
        limited(exact(() -> Math.addExact(max, other.max))));
  }

  Range times(long factor) {
    long a = limited(exact(() -> Math.multiplyExact(min, factor)));
    long b = limited(exact(() -> Math.multiplyExact(max, factor)));
    return new Range(Math.min(a, b), Math.max(a, b));
  }

  private Range times(Range other) {
    return hull(Stream.of(times(other.min), times(other.max)));
  }

  private Range squared() {
    Range size = magnitude();
    return new Range(size.times(size.min).min, size.times(size.max).max);
  }

  /**
   * A quotient is largest in magnitude where the divisor is closest to 0. Where that would be 0, it
   * is 1, as in the definition that makes a quotient total.
   */
  private Range dividedBy(Range divisor) {
    return hull(
        LongStream.of(divisor.min, -1, 1, divisor.max)
            .map(y -> y == 0 ? 1 : y)
            .filter(y -> divisor.contains(y) || (y == 1 && divisor.contains(0)))
            .mapToObj(y -> new Range(Math.min(min / y, max / y), Math.max(min / y, max / y))));
  }

  /** A remainder has the dividend's sign, and is smaller than the divisor. */
  private Range remainder(Range divisor) {
    long most = Math.max(0, divisor.magnitude().max - 1);
    long least = Math.max(Math.min(min, 0), -most);
    return new Range(least, Math.min(Math.max(max, 0), most));
  }

  /** The least range around all of at least one. */
  private static Range hull(Stream<Range> ranges) {
    return ranges
        .reduce((a, b) -> new Range(Math.min(a.min, b.min), Math.max(a.max, b.max)))
        .orElseThrow();
  }

  private Range magnitude() {
    long low = min > 0 ? min : max < 0 ? -max : 0;
    return new Range(low, Math.max(Math.abs(min), Math.abs(max)));
  }

  private boolean contains(long value) {
    return min <= value && value <= max;
  }

  boolean isFixed() {
    return min == max;
  }

  /** The range as the domain of a variable for {@code term}. */
  Domain domain(Term term) {
    if (min < -Domain.LIMIT || max > Domain.LIMIT) {
      throw new ModelException(
          term
              + " ranges over "
              + min
              + ".."
              + max
              + ", beyond what a variable can take (10^9 in magnitude); "
              + (term instanceof Term.Product
                  ? "use smaller domains"
                  : "keep the sum inside a comparison instead of naming it"));
    }
    return Domain.between((int) min, (int) max);
  }

  private static long exact(LongSupplier operation) {
    try {
      return operation.getAsLong();
    } catch (ArithmeticException e) {
      throw overflow(e);
    }
  }

  private static long limited(long value) {
    if (value > LinearSum.LIMIT || value < -LinearSum.LIMIT) {
      throw overflow(null);
    }
    return value;
  }

  private static ModelException overflow(ArithmeticException cause) {
    return new ModelException(
        "a sum or product can pass 2^62 - 1 in magnitude; use smaller coefficients or domains",
        cause);
  }
}
