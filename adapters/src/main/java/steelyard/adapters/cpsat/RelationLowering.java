package steelyard.adapters.cpsat;

import static steelyard.adapters.cpsat.ModelProto.joined;
import static steelyard.adapters.cpsat.ModelProto.negated;

import com.google.ortools.sat.AllDifferentConstraintProto;
import com.google.ortools.sat.ConstraintProto;
import com.google.ortools.sat.ElementConstraintProto;
import com.google.ortools.sat.LinearArgumentProto;
import com.google.ortools.sat.LinearConstraintProto;
import com.google.ortools.sat.TableConstraintProto;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
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
import steelyard.variants.model.LinearSum;
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
import steelyard.variants.model.Task;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * States a relation wherever all of some literals are true, with the library's own constraint where
 * it has one. Answers how; empty, and nothing stated, where the shared decomposition is better.
 */
final class RelationLowering implements RelationVisitor<Optional<String>> {
  private static final Optional<String> NATIVE = Optional.of("native");

  private final Parts parts;
  private final ModelProto proto;
  private final Places places;
  private final Literals literals;
  private final int[] enforcement;

  RelationLowering(Parts parts, int... enforcement) {
    this.parts = parts;
    this.proto = parts.proto();
    this.places = parts.places();
    this.literals = parts.literals();
    this.enforcement = enforcement;
  }

  /** What all relations of a model share. */
  record Parts(ModelProto proto, Places places, Literals literals, Intervals intervals) {}

  /** States that the relation cannot hold, or nothing where it always does. */
  private Optional<String> decided(boolean holds) {
    if (!holds) {
      proto.clause(negated(enforcement));
    }
    return NATIVE;
  }

  private Optional<String> post(ConstraintProto.Builder constraint, int named) {
    proto.post(constraint, named, enforcement);
    return NATIVE;
  }

  @Override
  public Optional<String> linear(Linear relation) {
    LinearSum sum = relation.sum();
    if (sum.size() == 0) {
      return decided(relation.op().holds(0, relation.bound()));
    }
    LinearConstraintProto.Builder linear = LinearConstraintProto.newBuilder();
    for (int i = 0; i < sum.size(); i++) {
      linear.addVars(places.of(sum.variable(i))).addCoeffs(sum.coefficient(i));
    }
    proto.linear(linear, relation.op(), relation.bound(), enforcement);
    return NATIVE;
  }

  /**
   * A clause of two literals, one of which belongs to an atom that has no Boolean yet, bounds that
   * atom's variable under the other instead of making one.
   */
  @Override
  public Optional<String> clause(Clause relation) {
    Atoms atoms = relation.atoms();
    List<Atom> open = new ArrayList<>(atoms.size());
    for (int i = 0; i < atoms.size(); i++) {
      Atom atom = literals.canonical(atoms.get(i));
      if (!atom.isConstant()) {
        open.add(atom);
      } else if (atom.equals(Atom.TRUE)) {
        return NATIVE;
      }
    }
    if (open.size() + enforcement.length <= 2) {
      List<Atom> bare = open.stream().filter(atom -> !literals.has(atom)).distinct().toList();
      if (bare.size() == 1) {
        open.removeAll(bare);
        literals.imply(bare.get(0), joined(enforcement, negated(literalsOf(open))));
        return NATIVE;
      }
    }
    proto.clause(joined(literalsOf(open), negated(enforcement)));
    return NATIVE;
  }

  private int[] literalsOf(List<Atom> canonical) {
    int[] made = new int[canonical.size()];
    for (int i = 0; i < made.length; i++) {
      made[i] = literals.of(canonical.get(i));
    }
    return made;
  }

  @Override
  public Optional<String> allDifferent(AllDifferent relation) {
    AllDifferentConstraintProto.Builder different =
        AllDifferentConstraintProto.newBuilder().addAllExprs(places.expressions(relation.scope()));
    return post(ConstraintProto.newBuilder().setAllDiff(different), relation.scope().size());
  }

  /**
   * The library's own where every entry is a constant. Its version 9.15 drops the constraint in
   * presolve where every entry becomes one variable and the result the same variable shifted; so
   * variable entries get an implication per index, as in Van Hentenryck &amp; Carillon (1988),
   * "Generality versus Specificity", AAAI, 660-664.
   */
  @Override
  public Optional<String> element(Element relation) {
    if (relation.array().size() == 0) {
      return decided(false);
    }
    if (!relation.isConstantArray()) {
      within(relation.index(), relation.array().size());
      IntStream.range(0, relation.array().size()).forEach(i -> entry(relation, i));
      return Optional.of("implication per index (Van Hentenryck & Carillon 1988)");
    }
    ElementConstraintProto.Builder element =
        ElementConstraintProto.newBuilder()
            .addAllExprs(places.expressions(relation.array()))
            .setLinearIndex(places.expression(relation.index()))
            .setLinearTarget(places.expression(relation.result()));
    return post(ConstraintProto.newBuilder().setElement(element), relation.array().size() + 2);
  }

  private void within(View view, int size) {
    clause(Clause.of(view.atLeast(0)));
    clause(Clause.of(view.atMost(size - 1L)));
  }

  private void entry(Element relation, int index) {
    Atom chosen = literals.canonical(relation.index().is(index));
    if (!chosen.equals(Atom.FALSE)) {
      Weights difference = new Weights();
      difference.add(1, relation.array().get(index), places);
      difference.add(-1, relation.result(), places);
      under(chosen).isZero(difference);
    }
  }

  /** The same under a further canonical atom that is not false. */
  private RelationLowering under(Atom canonical) {
    return canonical.isConstant()
        ? this
        : new RelationLowering(parts, joined(enforcement, literals.of(canonical)));
  }

  private void isZero(Weights sum) {
    if (sum.isConstant()) {
      decided(sum.constant() == 0);
    } else {
      proto.linear(sum.terms(), Comparison.EQ, -sum.constant(), enforcement);
    }
  }

  @Override
  public Optional<String> table(Table relation) {
    boolean allowed = relation.polarity() == Table.Polarity.ALLOWED;
    if (relation.rows().size() == 0) {
      return decided(!allowed);
    }
    if (relation.scope().size() == 0) {
      return decided(allowed);
    }
    Optional<TableConstraintProto.Builder> table = TableLowering.of(relation, places);
    return table.isPresent()
        ? post(ConstraintProto.newBuilder().setTable(table.get()), relation.scope().size())
        : Optional.empty();
  }

  @Override
  public Optional<String> maximum(Maximum relation) {
    LinearArgumentProto.Builder maximum =
        LinearArgumentProto.newBuilder()
            .addAllExprs(places.expressions(relation.terms()))
            .setTarget(places.expression(relation.result()));
    return post(ConstraintProto.newBuilder().setLinMax(maximum), relation.terms().size() + 1);
  }

  @Override
  public Optional<String> absolute(Absolute relation) {
    Views both = Views.of(relation.operand(), relation.operand().negated());
    return maximum(new Maximum(both, relation.result()));
  }

  @Override
  public Optional<String> noOverlap(NoOverlap relation) {
    parts.intervals().noOverlap(relation, enforcement);
    return NATIVE;
  }

  /** The library refutes a negative capacity even where no task runs: there it is not stated. */
  @Override
  public Optional<String> cumulative(Cumulative relation) {
    Atom usable = literals.canonical(relation.capacity().atLeast(0));
    if (!usable.equals(Atom.FALSE)) {
      parts.intervals().cumulative(relation, under(usable).enforcement);
    }
    for (Task task : relation.tasks().asList()) {
      clause(Clause.of(task.present().negated(), task.duration().atMost(0), usable));
    }
    return NATIVE;
  }

  /**
   * Each item's bin exists, and the sizes of the items in each bin sum to its load: Shaw (2004), "A
   * Constraint for Bin Packing", CP, LNCS 3258:648-662, section 2.
   */
  @Override
  public Optional<String> binPacking(BinPacking relation) {
    int bins = relation.loads().size();
    for (int i = 0; i < relation.bins().size(); i++) {
      within(relation.bins().get(i), bins);
    }
    for (int b = 0; b < bins; b++) {
      load(relation, b);
    }
    return Optional.of("weighted sum of item-in-bin literals per bin (Shaw 2004)");
  }

  /** What is larger than the largest load stays out, so that sums of sizes cannot overflow. */
  private void load(BinPacking relation, int bin) {
    View load = relation.loads().get(bin);
    Weights weights = new Weights();
    for (int i = 0; i < relation.bins().size(); i++) {
      View place = relation.bins().get(i);
      long size = relation.sizes().get(i);
      if (size > places.max(load)) {
        clause(Clause.of(place.is(bin).negated()));
      } else if (size > 0) {
        weights.add(size, literals.canonical(place.is(bin)), literals);
      }
    }
    weights.add(-1, load, places);
    isZero(weights);
  }

  @Override
  public Optional<String> allDifferentExcept(AllDifferentExcept relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> regular(Regular relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> globalCardinality(GlobalCardinality relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> count(Count relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> distinctValues(DistinctValues relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> product(Product relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> division(Division relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> modulo(Modulo relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> lexicographic(Lexicographic relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> inverse(Inverse relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> circuit(Circuit relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> subcircuit(Subcircuit relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> noOverlap2D(NoOverlap2D relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> knapsack(Knapsack relation) {
    return Optional.empty();
  }

  @Override
  public Optional<String> precedence(Precedence relation) {
    return Optional.empty();
  }
}
