package steelyard.variants.model.judge;

import java.util.List;
import java.util.function.LongBinaryOperator;
import steelyard.variants.model.Assignment;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/**
 * Whether a formula holds of an assignment, as written. A term is undefined where a part of it is;
 * the comparison around it is then false.
 */
final class FormulaJudge {
  private final Assignment values;
  private final RelationJudge relations;

  /** Set when a term met an entry outside its array or a divisor 0. */
  private boolean undefined;

  FormulaJudge(Assignment values) {
    this.values = values;
    this.relations = new RelationJudge(values);
  }

  boolean holds(Formula formula) {
    if (formula instanceof Formula.Compare compare) {
      return compare(compare);
    }
    if (formula instanceof Formula.Literal literal) {
      return values.holds(literal.atom());
    }
    if (formula instanceof Formula.Holds relation) {
      return relations.holds(relation.relation());
    }
    if (formula instanceof Formula.All all) {
      return all.parts().stream().allMatch(this::holds);
    }
    if (formula instanceof Formula.Any any) {
      return any.parts().stream().anyMatch(this::holds);
    }
    if (formula instanceof Formula.Not not) {
      return !holds(not.part());
    }
    Formula.Iff iff = (Formula.Iff) formula;
    return holds(iff.left()) == holds(iff.right());
  }

  private boolean compare(Formula.Compare compare) {
    boolean outside = undefined;
    undefined = false;
    long left = value(compare.left());
    long right = value(compare.right());
    boolean holds = !undefined && compare.op().holds(left, right);
    undefined = outside;
    return holds;
  }

  /** The value of a total term. */
  long total(Term term) {
    undefined = false;
    long value = value(term);
    if (undefined) {
      throw new IllegalStateException("a definition is undefined: " + term);
    }
    return value;
  }

  private long value(Term term) {
    if (term instanceof IntVar variable) {
      return values.value(variable.id());
    }
    if (term instanceof View view) {
      return values.value(view);
    }
    if (term instanceof Term.Constant constant) {
      return constant.value();
    }
    if (term instanceof Term.Sum sum) {
      return sum(sum);
    }
    if (term instanceof Term.Largest largest) {
      return fold(largest.terms(), Math::max);
    }
    if (term instanceof Term.Smallest smallest) {
      return fold(smallest.terms(), Math::min);
    }
    if (term instanceof Term.Absolute absolute) {
      return Math.abs(value(absolute.term()));
    }
    if (term instanceof Term.Product product) {
      return value(product.left()) * value(product.right());
    }
    if (term instanceof Term.Quotient quotient) {
      return divide(quotient.dividend(), quotient.divisor(), (x, y) -> x / y);
    }
    if (term instanceof Term.Remainder remainder) {
      return divide(remainder.dividend(), remainder.divisor(), (x, y) -> x % y);
    }
    if (term instanceof Term.Entry entry) {
      return entry(entry);
    }
    return holds(((Term.Truth) term).formula()) ? 1 : 0;
  }

  private long sum(Term.Sum sum) {
    long value = 0;
    for (int i = 0; i < sum.terms().size(); i++) {
      value += sum.coefficients().get(i) * value(sum.terms().get(i));
    }
    return value;
  }

  private long fold(List<Term> terms, LongBinaryOperator operator) {
    return terms.stream().mapToLong(this::value).reduce(operator).orElseThrow();
  }

  private long divide(Term dividend, Term divisor, LongBinaryOperator operator) {
    long x = value(dividend);
    long y = value(divisor);
    if (y == 0) {
      undefined = true;
      return 0;
    }
    return operator.applyAsLong(x, y);
  }

  private long entry(Term.Entry entry) {
    long index = value(entry.index());
    long[] array = entry.array().stream().mapToLong(this::value).toArray();
    if (index < 0 || index >= array.length) {
      undefined = true;
      return 0;
    }
    return array[(int) index];
  }
}
