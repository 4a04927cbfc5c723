package steelyard.variants.model;

import java.util.function.IntConsumer;

/** Calls a consumer with each variable that a constraint mentions; repeats are not removed. */
public final class Mentions implements RelationVisitor<Void> {
  private final IntConsumer seen;

  public Mentions(IntConsumer seen) {
    this.seen = seen;
  }

  public void of(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      atom(conditional.when());
      conditional.then().accept(this);
    } else {
      ((Relation) constraint).accept(this);
    }
  }

  public void of(LinearSum sum) {
    for (int i = 0; i < sum.size(); i++) {
      seen.accept(sum.variable(i));
    }
  }

  public void of(Views views) {
    for (int i = 0; i < views.size(); i++) {
      if (!views.isConstant(i)) {
        seen.accept(views.variable(i));
      }
    }
  }

  private void view(View view) {
    if (!view.isConstant()) {
      seen.accept(view.variable());
    }
  }

  private void atom(Atom atom) {
    if (!atom.isConstant()) {
      seen.accept(atom.variable());
    }
  }

  private void atoms(Atoms atoms) {
    for (int i = 0; i < atoms.size(); i++) {
      if (atoms.variable(i) != Atom.NONE) {
        seen.accept(atoms.variable(i));
      }
    }
  }

  private void tasks(Tasks tasks) {
    of(tasks.starts());
    of(tasks.durations());
    of(tasks.ends());
    atoms(tasks.presences());
  }

  @Override
  public Void linear(Linear relation) {
    of(relation.sum());
    return null;
  }

  @Override
  public Void clause(Clause relation) {
    atoms(relation.atoms());
    return null;
  }

  @Override
  public Void allDifferent(AllDifferent relation) {
    of(relation.scope());
    return null;
  }

  @Override
  public Void element(Element relation) {
    of(relation.array());
    view(relation.index());
    view(relation.result());
    return null;
  }

  @Override
  public Void table(Table relation) {
    of(relation.scope());
    return null;
  }

  @Override
  public Void maximum(Maximum relation) {
    of(relation.terms());
    view(relation.result());
    return null;
  }

  @Override
  public Void noOverlap(NoOverlap relation) {
    tasks(relation.tasks());
    return null;
  }

  @Override
  public Void cumulative(Cumulative relation) {
    tasks(relation.tasks());
    of(relation.demands());
    view(relation.capacity());
    return null;
  }

  @Override
  public Void binPacking(BinPacking relation) {
    of(relation.bins());
    of(relation.loads());
    return null;
  }

  @Override
  public Void allDifferentExcept(AllDifferentExcept relation) {
    of(relation.scope());
    return null;
  }

  @Override
  public Void regular(Regular relation) {
    of(relation.word());
    return null;
  }

  @Override
  public Void globalCardinality(GlobalCardinality relation) {
    of(relation.scope());
    of(relation.counts());
    return null;
  }

  @Override
  public Void count(Count relation) {
    of(relation.scope());
    view(relation.bound());
    return null;
  }

  @Override
  public Void distinctValues(DistinctValues relation) {
    of(relation.scope());
    view(relation.bound());
    return null;
  }

  @Override
  public Void absolute(Absolute relation) {
    view(relation.operand());
    view(relation.result());
    return null;
  }

  @Override
  public Void product(Product relation) {
    view(relation.left());
    view(relation.right());
    view(relation.result());
    return null;
  }

  @Override
  public Void division(Division relation) {
    view(relation.dividend());
    view(relation.divisor());
    view(relation.quotient());
    return null;
  }

  @Override
  public Void modulo(Modulo relation) {
    view(relation.dividend());
    view(relation.divisor());
    view(relation.remainder());
    return null;
  }

  @Override
  public Void lexicographic(Lexicographic relation) {
    of(relation.left());
    of(relation.right());
    return null;
  }

  @Override
  public Void inverse(Inverse relation) {
    of(relation.forward());
    of(relation.backward());
    return null;
  }

  @Override
  public Void circuit(Circuit relation) {
    of(relation.successors());
    return null;
  }

  @Override
  public Void subcircuit(Subcircuit relation) {
    of(relation.successors());
    return null;
  }

  @Override
  public Void noOverlap2D(NoOverlap2D relation) {
    tasks(relation.across());
    tasks(relation.up());
    return null;
  }

  @Override
  public Void knapsack(Knapsack relation) {
    of(relation.amounts());
    view(relation.capacity());
    view(relation.profit());
    return null;
  }

  @Override
  public Void precedence(Precedence relation) {
    of(relation.scope());
    return null;
  }
}
