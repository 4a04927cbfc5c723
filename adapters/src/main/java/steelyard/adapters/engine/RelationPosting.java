package steelyard.adapters.engine;

import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.propagators.Level;
import steelyard.adapters.engine.propagators.Relations;
import steelyard.adapters.engine.propagators.TaskScope;
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
import steelyard.variants.model.Element;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.Views;

/**
 * Posts {@code when ⇒ relation} in the engine's own form of its kind; answers false, and posts
 * nothing, where it has none.
 */
final class RelationPosting implements RelationVisitor<Boolean> {
  private final Places places;
  private final Relations relations;
  private final Level level;
  private final int tag;
  private final long when;

  RelationPosting(Places places, Relations relations, Level level, int tag, long when) {
    this.places = places;
    this.relations = relations;
    this.level = level;
    this.tag = tag;
    this.when = when;
  }

  @Override
  public Boolean linear(Linear relation) {
    switch (relation.op()) {
      case LE -> relations.atMost(tag, when, places.sum(relation.sum()), relation.bound());
      case GE -> relations.atLeast(tag, when, places.sum(relation.sum()), relation.bound());
      case EQ -> relations.equal(tag, when, places.sum(relation.sum()), relation.bound());
      case NE -> relations.unequal(tag, when, places.sum(relation.sum()), relation.bound());
    }
    return true;
  }

  @Override
  public Boolean clause(Clause relation) {
    relations.clause(tag, when, places.atoms(relation.atoms()));
    return true;
  }

  @Override
  public Boolean allDifferent(AllDifferent relation) {
    relations.allDifferent(tag, when, places.scope(relation.scope()), level);
    return true;
  }

  @Override
  public Boolean element(Element relation) {
    Scope array = places.scope(relation.array());
    Scope index = places.scope(relation.index());
    relations.element(tag, when, array, index, places.scope(relation.result()));
    return true;
  }

  @Override
  public Boolean table(Table relation) {
    Scope scope = places.scope(relation.scope());
    boolean allowed = relation.polarity() == Table.Polarity.ALLOWED;
    int[] tuples = tuples(relation.rows());
    if (scope.size() == 0 || tuples.length == 0) {
      boolean holds = allowed == (relation.rows().size() > 0);
      relations.clause(tag, when, holds ? Atom.TRUE : Atom.FALSE);
    } else if (!allowed) {
      relations.forbidden(tag, when, scope, tuples);
    } else if (relations.fits(scope, tuples)) {
      relations.allowed(tag, when, scope, tuples);
    } else {
      return false;
    }
    return true;
  }

  private static int[] tuples(Tuples rows) {
    int arity = rows.arity();
    return IntStream.range(0, rows.size() * arity)
        .map(t -> rows.get(t / arity, t % arity))
        .map(v -> v == Tuples.ANY ? Relations.ANY : v)
        .toArray();
  }

  @Override
  public Boolean maximum(Maximum relation) {
    Scope terms = places.scope(relation.terms());
    relations.maximum(tag, when, terms, places.scope(relation.result()));
    return true;
  }

  @Override
  public Boolean absolute(Absolute relation) {
    Views both = Views.of(relation.operand(), relation.operand().negated());
    return maximum(new Maximum(both, relation.result()));
  }

  @Override
  public Boolean noOverlap(NoOverlap relation) {
    relations.noOverlap(tag, when, tasks(relation.tasks()));
    return true;
  }

  @Override
  public Boolean cumulative(Cumulative relation) {
    Scope demands = places.scope(relation.demands());
    Scope capacity = places.scope(relation.capacity());
    relations.cumulative(tag, when, tasks(relation.tasks()), demands, capacity);
    return true;
  }

  private TaskScope tasks(Tasks tasks) {
    return new TaskScope(
        places.scope(tasks.starts()),
        places.scope(tasks.durations()),
        places.scope(tasks.ends()),
        places.atoms(tasks.presences()));
  }

  @Override
  public Boolean binPacking(BinPacking relation) {
    Scope bins = places.scope(relation.bins());
    long[] sizes = relation.sizes().stream().toArray();
    relations.binPacking(tag, when, bins, sizes, places.scope(relation.loads()));
    return true;
  }

  @Override
  public Boolean allDifferentExcept(AllDifferentExcept relation) {
    return false;
  }

  @Override
  public Boolean regular(Regular relation) {
    return false;
  }

  @Override
  public Boolean globalCardinality(GlobalCardinality relation) {
    return false;
  }

  @Override
  public Boolean count(Count relation) {
    return false;
  }

  @Override
  public Boolean distinctValues(DistinctValues relation) {
    return false;
  }

  @Override
  public Boolean product(Product relation) {
    return false;
  }

  @Override
  public Boolean division(Division relation) {
    return false;
  }

  @Override
  public Boolean modulo(Modulo relation) {
    return false;
  }

  @Override
  public Boolean lexicographic(Lexicographic relation) {
    return false;
  }

  @Override
  public Boolean inverse(Inverse relation) {
    return false;
  }

  @Override
  public Boolean circuit(Circuit relation) {
    return false;
  }

  @Override
  public Boolean subcircuit(Subcircuit relation) {
    return false;
  }

  @Override
  public Boolean noOverlap2D(NoOverlap2D relation) {
    return false;
  }

  @Override
  public Boolean knapsack(Knapsack relation) {
    return false;
  }

  @Override
  public Boolean precedence(Precedence relation) {
    return false;
  }
}
