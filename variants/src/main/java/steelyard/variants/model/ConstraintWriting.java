package steelyard.variants.model;

import java.util.function.IntConsumer;

/** Writes constraints into a digest; how a variable is written is the caller's. */
final class ConstraintWriting implements RelationVisitor<Void> {
  private final Digester out;
  private final IntConsumer variable;

  ConstraintWriting(Digester out, IntConsumer variable) {
    this.out = out;
    this.variable = variable;
  }

  void constraint(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      out.add("conditional").add(conditional.mode().name());
      atom(conditional.when());
      relation(conditional.then());
    } else {
      relation((Relation) constraint);
    }
  }

  private void relation(Relation relation) {
    out.add(relation.kind());
    relation.accept(this);
  }

  void sum(LinearSum sum) {
    out.add(sum.size());
    for (int i = 0; i < sum.size(); i++) {
      variable.accept(sum.variable(i));
      out.add(sum.coefficient(i));
    }
    out.add(sum.constant());
  }

  void views(Views views) {
    out.add(views.size());
    for (int i = 0; i < views.size(); i++) {
      view(views.get(i));
    }
  }

  private void view(View view) {
    out.add(view.sign()).add(view.offset());
    if (!view.isConstant()) {
      variable.accept(view.variable());
    }
  }

  private void atom(Atom atom) {
    out.add(atom.op().code()).add(atom.value()).add(atom.isConstant() ? 0 : 1);
    if (!atom.isConstant()) {
      variable.accept(atom.variable());
    }
  }

  private void atoms(Atoms atoms) {
    out.add(atoms.size());
    for (int i = 0; i < atoms.size(); i++) {
      atom(atoms.get(i));
    }
  }

  private void longs(Longs longs) {
    out.add(longs.size());
    longs.stream().forEach(out::add);
  }

  private void ints(Ints ints) {
    out.add(ints.size());
    ints.stream().forEach(out::add);
  }

  private void tuples(Tuples rows) {
    out.add(rows.size()).add(rows.arity());
    for (int row = 0; row < rows.size(); row++) {
      for (int column = 0; column < rows.arity(); column++) {
        out.add(rows.get(row, column));
      }
    }
  }

  private void automaton(Automaton automaton) {
    out.add(automaton.states()).add(automaton.start());
    ints(automaton.accepting());
    tuples(automaton.transitions());
  }

  private void tasks(Tasks tasks) {
    views(tasks.starts());
    views(tasks.durations());
    views(tasks.ends());
    atoms(tasks.presences());
  }

  @Override
  public Void linear(Linear relation) {
    sum(relation.sum());
    out.add(relation.op().name()).add(relation.bound());
    return null;
  }

  @Override
  public Void clause(Clause relation) {
    atoms(relation.atoms());
    return null;
  }

  @Override
  public Void allDifferent(AllDifferent relation) {
    views(relation.scope());
    return null;
  }

  @Override
  public Void element(Element relation) {
    views(relation.array());
    view(relation.index());
    view(relation.result());
    return null;
  }

  @Override
  public Void table(Table relation) {
    views(relation.scope());
    out.add(relation.polarity().name());
    tuples(relation.rows());
    return null;
  }

  @Override
  public Void maximum(Maximum relation) {
    views(relation.terms());
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
    views(relation.demands());
    view(relation.capacity());
    return null;
  }

  @Override
  public Void binPacking(BinPacking relation) {
    views(relation.bins());
    longs(relation.sizes());
    views(relation.loads());
    return null;
  }

  @Override
  public Void allDifferentExcept(AllDifferentExcept relation) {
    views(relation.scope());
    ints(relation.except());
    return null;
  }

  @Override
  public Void regular(Regular relation) {
    views(relation.word());
    automaton(relation.automaton());
    return null;
  }

  @Override
  public Void globalCardinality(GlobalCardinality relation) {
    views(relation.scope());
    ints(relation.values());
    views(relation.counts());
    out.add(relation.others().name());
    return null;
  }

  @Override
  public Void count(Count relation) {
    views(relation.scope());
    ints(relation.values());
    out.add(relation.op().name());
    view(relation.bound());
    return null;
  }

  @Override
  public Void distinctValues(DistinctValues relation) {
    views(relation.scope());
    out.add(relation.op().name());
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
    views(relation.left());
    views(relation.right());
    out.add(relation.ties().name());
    return null;
  }

  @Override
  public Void inverse(Inverse relation) {
    views(relation.forward());
    views(relation.backward());
    return null;
  }

  @Override
  public Void circuit(Circuit relation) {
    views(relation.successors());
    return null;
  }

  @Override
  public Void subcircuit(Subcircuit relation) {
    views(relation.successors());
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
    views(relation.amounts());
    longs(relation.weights());
    view(relation.capacity());
    longs(relation.profits());
    view(relation.profit());
    return null;
  }

  @Override
  public Void precedence(Precedence relation) {
    views(relation.scope());
    ints(relation.values());
    return null;
  }
}
