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
}
