package steelyard.adapters.spi;

import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Atom;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
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
import steelyard.variants.model.Relation;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * The decomposition of each kind of relation that all backends share: what a backend does with a
 * kind, or with a form of it, that its library does not have or answers wrongly.
 */
public final class Decomposition implements RelationVisitor<String> {
  private final Definer definer;
  private final Conditions conditions;
  private final Arithmetic arithmetic;
  private final Counting counting;
  private final Sequences sequences;
  private final Tours tours;
  private final Layouts layouts;

  private Decomposition(Fresh fresh) {
    definer = new Definer(fresh);
    conditions = new Conditions(definer);
    arithmetic = new Arithmetic(definer, conditions);
    counting = new Counting(definer, conditions);
    sequences = new Sequences(definer, conditions);
    tours = new Tours(definer, conditions);
    layouts = new Layouts(definer, conditions);
  }

  /** When {@code relation} holds. */
  public static Truth of(Relation relation, Fresh fresh) {
    Decomposition it = new Decomposition(fresh);
    String how = relation.accept(it);
    List<Clause> holds = it.conditions.clauses();
    return new Truth(how, it.definer.definitions(), holds, it.conditions.also());
  }

  /** The constraint that {@code relation} holds, in simpler ones. */
  public static Reduction posted(Relation relation, Fresh fresh) {
    return of(new Conditional(Atom.TRUE, Conditional.Mode.IF, relation), fresh);
  }

  /**
   * The constraint in simpler ones. Of a relation that must hold, these may be some that could not
   * say that it does not.
   */
  public static Reduction of(Conditional constraint, Fresh fresh) {
    boolean isPosted =
        constraint.when().equals(Atom.TRUE) && constraint.mode() != Conditional.Mode.ONLY_IF;
    Optional<Reduction> posted = isPosted ? Posted.of(constraint.then(), fresh) : Optional.empty();
    return posted.orElseGet(() -> conditional(constraint, fresh));
  }

  private static Reduction conditional(Conditional constraint, Fresh fresh) {
    Decomposition it = new Decomposition(fresh);
    String how = constraint.then().accept(it);
    List<Constraint> asserted = it.conditions.under(constraint.when(), constraint.mode());
    return new Reduction(how, it.definer.definitions(), asserted);
  }

  /** One literal that is true exactly where the relation holds. */
  @Override
  public String linear(Linear relation) {
    conditions.require(relation.sum(), relation.op(), relation.bound());
    return "reified by a literal";
  }

  @Override
  public String clause(Clause relation) {
    conditions.require(relation.atoms().stream().toList());
    return "itself";
  }

  /** Any two views differ. */
  @Override
  public String allDifferent(AllDifferent relation) {
    return allDifferentExcept(AllDifferentExcept.of(relation.scope()));
  }

  /** Any two views differ, or the first has an excepted value. */
  @Override
  public String allDifferentExcept(AllDifferentExcept relation) {
    Views scope = relation.scope();
    for (int i = 0; i < scope.size(); i++) {
      View left = scope.get(i);
      Atom[] excepted = relation.except().stream().mapToObj(left::is).toArray(Atom[]::new);
      for (int j = i + 1; j < scope.size(); j++) {
        conditions.require(left, Comparison.NE, scope.get(j), excepted);
      }
    }
    return "pairwise disequalities (van Hoeve 2001)";
  }

  /**
   * The index is in the array, and each index implies that its entry is the result. Source of the
   * constraint: Van Hentenryck &amp; Carillon (1988), "Generality versus Specificity", AAAI.
   */
  @Override
  public String element(Element relation) {
    View index = relation.index();
    Views array = relation.array();
    conditions.requireWithin(index, array.size());
    for (int i = 0; i < array.size(); i++) {
      Atom elsewhere = index.is(i).negated();
      conditions.require(array.get(i), Comparison.EQ, relation.result(), elsewhere);
    }
    return "implication per index (Van Hentenryck & Carillon 1988)";
  }

  /**
   * Allowed: a literal for each row, one of which is true; Bacchus (2007), "GAC via Unit
   * Propagation", CP, LNCS 4741:133-147. Forbidden: a clause for each row; Walsh (2000), "SAT v
   * CSP", CP, LNCS 1894:441-456.
   */
  @Override
  public String table(Table relation) {
    List<List<Atom>> rows =
        IntStream.range(0, relation.rows().size()).mapToObj(r -> row(relation, r)).toList();
    if (relation.polarity() == Table.Polarity.FORBIDDEN) {
      rows.forEach(row -> conditions.require(row.stream().map(Atom::negated).toList()));
      return "clause per row (Walsh 2000)";
    }
    conditions.require(rows.stream().map(definer::all).toList());
    return "literal per row (Bacchus 2007)";
  }

  private static List<Atom> row(Table relation, int row) {
    Tuples rows = relation.rows();
    return IntStream.range(0, rows.arity())
        .filter(c -> rows.get(row, c) != Tuples.ANY)
        .mapToObj(c -> relation.scope().get(c).is(rows.get(row, c)))
        .toList();
  }

  @Override
  public String regular(Regular relation) {
    return sequences.regular(relation);
  }

  @Override
  public String globalCardinality(GlobalCardinality relation) {
    return counting.globalCardinality(relation);
  }

  @Override
  public String count(Count relation) {
    return counting.count(relation);
  }

  @Override
  public String distinctValues(DistinctValues relation) {
    return counting.distinctValues(relation);
  }

  @Override
  public String maximum(Maximum relation) {
    return arithmetic.maximum(relation);
  }

  @Override
  public String absolute(Absolute relation) {
    return arithmetic.absolute(relation);
  }

  @Override
  public String product(Product relation) {
    return arithmetic.product(relation);
  }

  @Override
  public String division(Division relation) {
    return arithmetic.division(relation);
  }

  @Override
  public String modulo(Modulo relation) {
    return arithmetic.modulo(relation);
  }

  @Override
  public String lexicographic(Lexicographic relation) {
    return sequences.lexicographic(relation);
  }

  @Override
  public String inverse(Inverse relation) {
    return tours.inverse(relation);
  }

  @Override
  public String circuit(Circuit relation) {
    return tours.circuit(relation);
  }

  @Override
  public String subcircuit(Subcircuit relation) {
    return tours.subcircuit(relation);
  }

  @Override
  public String noOverlap(NoOverlap relation) {
    return layouts.noOverlap(relation);
  }

  @Override
  public String noOverlap2D(NoOverlap2D relation) {
    return layouts.noOverlap2D(relation);
  }

  @Override
  public String cumulative(Cumulative relation) {
    return layouts.cumulative(relation);
  }

  @Override
  public String binPacking(BinPacking relation) {
    return counting.binPacking(relation);
  }

  @Override
  public String knapsack(Knapsack relation) {
    return counting.knapsack(relation);
  }

  @Override
  public String precedence(Precedence relation) {
    return sequences.precedence(relation);
  }
}
