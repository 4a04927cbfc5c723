package steelyard.variants.model.build;

import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Element;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Mentions;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Relation;
import steelyard.variants.model.RelationVisitor;
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

  private Void tasks(Tasks tasks, String kind) {
    nonNegative(tasks.durations(), "a duration of " + kind);
    return null;
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
