package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Atom;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Element;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Relation;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Table;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * The decomposition of each kind of relation that all backends share: what a backend does with a
 * kind, or with a form of it, that its library does not have or answers wrongly.
 */
public final class Decomposition implements RelationVisitor<String> {
  private final Definer definer;
  private final List<Clause> holds = new ArrayList<>();

  private Decomposition(Definer definer) {
    this.definer = definer;
  }

  /** When {@code relation} holds. */
  public static Truth of(Relation relation, Fresh fresh) {
    Definer definer = new Definer(fresh);
    Decomposition decomposition = new Decomposition(definer);
    String how = relation.accept(decomposition);
    return new Truth(how, definer.definitions(), decomposition.holds);
  }

  /** The constraint with definitions and clauses alone. */
  public static Reduction of(Conditional constraint, Fresh fresh) {
    Definer definer = new Definer(fresh);
    Decomposition decomposition = new Decomposition(definer);
    String how = constraint.then().accept(decomposition);
    List<Clause> asserted = decomposition.under(constraint.when(), constraint.mode());
    return new Reduction(how, definer.definitions(), asserted);
  }

  private List<Clause> under(Atom when, Conditional.Mode mode) {
    List<Clause> asserted = new ArrayList<>();
    if (mode != Conditional.Mode.ONLY_IF) {
      for (Clause clause : holds) {
        List<Atom> atoms = new ArrayList<>(List.of(when.negated()));
        clause.atoms().stream().forEach(atoms::add);
        definer.clause(atoms).ifPresent(asserted::add);
      }
    }
    if (mode != Conditional.Mode.IF) {
      List<Atom> atoms = new ArrayList<>(List.of(when));
      holds.forEach(clause -> atoms.add(definer.any(clause.atoms().stream().toList()).negated()));
      definer.clause(atoms).ifPresent(asserted::add);
    }
    return asserted;
  }

  private void require(Atom... atoms) {
    require(List.of(atoms));
  }

  private void require(List<Atom> atoms) {
    definer.clause(atoms).ifPresent(holds::add);
  }

  /** One literal that is true exactly where the relation holds. */
  @Override
  public String linear(Linear relation) {
    require(definer.holds(relation.sum(), relation.op(), relation.bound()));
    return "reified by a literal";
  }

  @Override
  public String clause(Clause relation) {
    require(relation.atoms().stream().toList());
    return "itself";
  }

  /** Any two views differ. */
  @Override
  public String allDifferent(AllDifferent relation) {
    Views scope = relation.scope();
    for (int i = 0; i < scope.size(); i++) {
      for (int j = i + 1; j < scope.size(); j++) {
        require(definer.compare(scope.get(i), Comparison.NE, scope.get(j)));
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
    requireWithin(index, array.size());
    for (int i = 0; i < array.size(); i++) {
      if (definer.mayBe(index.is(i))) {
        Atom entry = definer.compare(array.get(i), Comparison.EQ, relation.result());
        require(index.is(i).negated(), entry);
      }
    }
    return "implication per index (Van Hentenryck & Carillon 1988)";
  }

  private void requireWithin(View view, int size) {
    require(view.atLeast(0));
    require(view.atMost(size - 1L));
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
      rows.forEach(row -> require(row.stream().map(Atom::negated).toList()));
      return "clause per row (Walsh 2000)";
    }
    require(rows.stream().map(definer::all).toList());
    return "literal per row (Bacchus 2007)";
  }

  private static List<Atom> row(Table relation, int row) {
    Tuples rows = relation.rows();
    return IntStream.range(0, rows.arity())
        .filter(c -> rows.get(row, c) != Tuples.ANY)
        .mapToObj(c -> relation.scope().get(c).is(rows.get(row, c)))
        .toList();
  }

  /** The result is at least every term, and at most one of them. */
  @Override
  public String maximum(Maximum relation) {
    List<View> terms = relation.terms().stream().toList();
    View result = relation.result();
    terms.forEach(term -> require(definer.compare(term, Comparison.LE, result)));
    require(terms.stream().map(t -> definer.compare(t, Comparison.GE, result)).toList());
    return "at least every term, at most one";
  }

  /**
   * One disjunction for each pair of tasks: Balas (1969), "Machine Sequencing via Disjunctive
   * Graphs", Operations Research 17(6):941-957.
   */
  @Override
  public String noOverlap(NoOverlap relation) {
    List<Task> tasks = relation.tasks().asList();
    for (int i = 0; i < tasks.size(); i++) {
      for (int j = i + 1; j < tasks.size(); j++) {
        Task a = tasks.get(i);
        Task b = tasks.get(j);
        require(
            a.present().negated(),
            b.present().negated(),
            definer.compare(a.end(), Comparison.LE, b.start()),
            definer.compare(b.end(), Comparison.LE, a.start()));
      }
    }
    return "disjunction per pair (Balas 1969)";
  }

  /**
   * Demands are not negative, so their sum is largest at the start of some task that runs: there it
   * must fit. The task decomposition of Schutt, Feydy, Stuckey &amp; Wallace (2009), "Why
   * Cumulative Decomposition Is Not as Bad as It Sounds", CP, LNCS 5732:746-761, section 3.
   */
  @Override
  public String cumulative(Cumulative relation) {
    for (int at = 0; at < relation.tasks().size(); at++) {
      Task task = relation.tasks().get(at);
      require(
          task.present().negated(),
          definer.compare(task.end(), Comparison.LE, task.start()),
          fitsAtStartOf(at, relation));
    }
    return "task decomposition (Schutt et al. 2009)";
  }

  /**
   * The literal that says the demands of task {@code at} and of those that run at its start fit.
   */
  private Atom fitsAtStartOf(int at, Cumulative relation) {
    Tasks tasks = relation.tasks();
    View time = tasks.starts().get(at);
    Sum sum = new Sum().add(1, relation.demands().get(at)).add(-1, relation.capacity());
    for (int i = 0; i < tasks.size(); i++) {
      if (i != at) {
        definer.addWhere(runs(tasks.get(i), time), relation.demands().get(i), sum);
      }
    }
    return definer.holds(sum.toLinearSum(), Comparison.LE, 0);
  }

  private Atom runs(Task task, View time) {
    return definer.all(
        List.of(
            task.present(),
            definer.compare(task.start(), Comparison.LE, time),
            definer.compare(task.end(), Comparison.LE, time).negated()));
  }

  /**
   * Every bin exists, and the sizes in each sum to its load: Shaw (2004), "A Constraint for Bin
   * Packing", CP, LNCS 3258:648-662, section 2.
   */
  @Override
  public String binPacking(BinPacking relation) {
    Views bins = relation.bins();
    bins.stream().forEach(bin -> requireWithin(bin, relation.loads().size()));
    for (int b = 0; b < relation.loads().size(); b++) {
      Sum sum = new Sum().add(-1, relation.loads().get(b));
      for (int i = 0; i < bins.size(); i++) {
        if (relation.sizes().get(i) != 0) {
          sum.add(relation.sizes().get(i), definer.counted(bins.get(i).is(b)));
        }
      }
      require(definer.holds(sum.toLinearSum(), Comparison.EQ, 0));
    }
    return "weighted sum per bin (Shaw 2004)";
  }
}
