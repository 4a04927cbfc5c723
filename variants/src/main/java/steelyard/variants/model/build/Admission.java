package steelyard.variants.model.build;

import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Count;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Formula;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Mentions;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/** Refuses relations whose variables do not exist or whose values cannot mean anything. */
final class Admission implements RelationVisitor<Void> {
  private final Pool pool;

  Admission(Pool pool) {
    this.pool = pool;
  }

  /** Checks every relation and variable in {@code formula}. */
  void check(Formula formula) {
    if (formula instanceof Formula.Holds holds) {
      check(holds.relation());
    } else if (formula instanceof Formula.All all) {
      all.parts().forEach(this::check);
    } else if (formula instanceof Formula.Any any) {
      any.parts().forEach(this::check);
    } else if (formula instanceof Formula.Not not) {
      check(not.part());
    } else if (formula instanceof Formula.Iff iff) {
      check(iff.left());
      check(iff.right());
    } else if (formula instanceof Formula.Literal literal) {
      if (!literal.atom().isConstant()) {
        pool.domain(literal.atom().variable());
      }
    } else {
      Formula.Compare compare = (Formula.Compare) formula;
      check(compare.left());
      check(compare.right());
    }
  }

  /** Checks every relation and variable in {@code term}; its range is checked with them. */
  void check(Term term) {
    if (term instanceof Term.Truth truth) {
      check(truth.formula());
    } else if (term instanceof Term.Sum sum) {
      sum.terms().forEach(this::check);
    } else if (term instanceof Term.Largest largest) {
      largest.terms().forEach(this::check);
    } else if (term instanceof Term.Smallest smallest) {
      smallest.terms().forEach(this::check);
    } else if (term instanceof Term.Absolute absolute) {
      check(absolute.term());
    } else if (term instanceof Term.Product product) {
      check(product.left());
      check(product.right());
    } else if (term instanceof Term.Quotient quotient) {
      check(quotient.dividend());
      check(quotient.divisor());
    } else if (term instanceof Term.Remainder remainder) {
      check(remainder.dividend());
      check(remainder.divisor());
    } else if (term instanceof Term.Entry entry) {
      entry.array().forEach(this::check);
      check(entry.index());
    }
    Range.of(term, pool);
  }

  private void check(Relation relation) {
    new Mentions(pool::domain).of(relation);
    relation.accept(this);
  }

  @Override
  public Void linear(Linear relation) {
    Range range = Range.of(relation.sum(), pool);
    range.plus(new Range(-Math.abs(relation.bound()), Math.abs(relation.bound())));
    return null;
  }

  @Override
  public Void clause(Clause relation) {
    return null;
  }

  @Override
  public Void allDifferent(AllDifferent relation) {
    return null;
  }

  @Override
  public Void element(Element relation) {
    return null;
  }

  @Override
  public Void table(Table relation) {
    return null;
  }

  @Override
  public Void maximum(Maximum relation) {
    return null;
  }

  @Override
  public Void noOverlap(NoOverlap relation) {
    return tasks(relation.tasks(), "no-overlap");
  }

  @Override
  public Void cumulative(Cumulative relation) {
    nonNegative(relation.demands(), "a demand of cumulative");
    long total = 0;
    for (int i = 0; i < relation.demands().size(); i++) {
      total += range(relation.demands().get(i)).max();
    }
    bounded(total, "the demands of cumulative");
    return tasks(relation.tasks(), "cumulative");
  }

  @Override
  public Void binPacking(BinPacking relation) {
    long total = 0;
    for (int i = 0; i < relation.sizes().size(); i++) {
      total = bounded(total + relation.sizes().get(i), "the sizes of bin packing");
    }
    return null;
  }

  @Override
  public Void allDifferentExcept(AllDifferentExcept relation) {
    return null;
  }

  @Override
  public Void regular(Regular relation) {
    return null;
  }

  @Override
  public Void globalCardinality(GlobalCardinality relation) {
    return null;
  }

  @Override
  public Void count(Count relation) {
    return null;
  }

  @Override
  public Void distinctValues(DistinctValues relation) {
    return null;
  }

  @Override
  public Void absolute(Absolute relation) {
    return null;
  }

  @Override
  public Void product(Product relation) {
    bounded(Views.of(relation.left(), relation.right()), "a factor");
    return null;
  }

  @Override
  public Void division(Division relation) {
    bounded(
        Views.of(relation.dividend(), relation.divisor(), relation.quotient()),
        "a view of a division");
    return null;
  }

  @Override
  public Void modulo(Modulo relation) {
    bounded(
        Views.of(relation.dividend(), relation.divisor(), relation.remainder()),
        "a view of a modulo");
    return null;
  }

  @Override
  public Void lexicographic(Lexicographic relation) {
    return null;
  }

  @Override
  public Void inverse(Inverse relation) {
    return null;
  }

  @Override
  public Void circuit(Circuit relation) {
    return null;
  }

  @Override
  public Void subcircuit(Subcircuit relation) {
    return null;
  }

  @Override
  public Void noOverlap2D(NoOverlap2D relation) {
    tasks(relation.across(), "no-overlap-2d");
    return tasks(relation.up(), "no-overlap-2d");
  }

  @Override
  public Void knapsack(Knapsack relation) {
    sum(relation.amounts(), relation.weights(), relation.capacity());
    return sum(relation.amounts(), relation.profits(), relation.profit());
  }

  @Override
  public Void precedence(Precedence relation) {
    return null;
  }

  private Void tasks(Tasks tasks, String kind) {
    nonNegative(tasks.durations(), "a duration of " + kind);
    return null;
  }

  private Void sum(Views amounts, Longs factors, View total) {
    long most = Math.max(Math.abs(range(total).min()), Math.abs(range(total).max()));
    Range sum = new Range(-most, most);
    for (int i = 0; i < amounts.size(); i++) {
      sum = sum.plus(range(amounts.get(i)).times(factors.get(i)));
    }
    return null;
  }

  /** A product of two such values is far from 2^62. */
  private void bounded(Views views, String what) {
    for (int i = 0; i < views.size(); i++) {
      Range range = range(views.get(i));
      if (range.min() < -Domain.LIMIT || range.max() > Domain.LIMIT) {
        throw new ModelException(
            what + " can pass 10^9 in magnitude: " + range.min() + ".." + range.max());
      }
    }
  }

  private void nonNegative(Views views, String what) {
    for (int i = 0; i < views.size(); i++) {
      if (range(views.get(i)).min() < 0) {
        throw new ModelException(what + " can be negative: number " + i);
      }
    }
  }

  private static long bounded(long total, String what) {
    if (total > LinearSum.LIMIT || total < 0) {
      throw new ModelException(what + " sum to more than 2^62 - 1");
    }
    return total;
  }

  private Range range(View view) {
    return Range.of(view, pool);
  }
}
