package steelyard.adapters.sat.encoding;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.Optional;
import java.util.function.BooleanSupplier;
import java.util.function.IntConsumer;
import java.util.stream.IntStream;
import java.util.stream.Stream;
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
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Model;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Posting;
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
 * Domains without values that no solution takes, found before encoding because the order encoding
 * pays for each value: what single literals, tables and arrays leave, then bounds propagation of
 * posted linear relations and maxima to a fixpoint, or until it has taken long enough.
 *
 * <p>Source: Harvey &amp; Schimpf (2002), "Bounds Consistency Techniques for Long Linear
 * Constraints", TRICS.
 */
final class RootDomains implements RelationVisitor<Void> {
  /** Slowly converging cycles, such as x &lt; y &lt; x, are cut off; what was found holds. */
  private static final int VISITS_PER_RULE = 50;

  private static final int VISITS_BETWEEN_LOOKS = 1 << 12;

  private final Bounds bounds;
  private final List<Rule> rules = new ArrayList<>();

  /** The rules that mention a variable stand together, from its place in {@code startAt}. */
  private final int[] startAt;

  private int[] mentioning = {};
  private final ArrayDeque<Integer> open = new ArrayDeque<>();
  private final BitSet isOpen = new BitSet();

  private RootDomains(List<Domain> domains) {
    this.bounds = new Bounds(domains, this::wakeAll);
    this.startAt = new int[domains.size() + 1];
  }

  /**
   * The domains of the model's variables; empty if it is found to have no solution.
   *
   * @param stop asked now and then whether to be content with what has been found
   */
  static Optional<List<Domain>> of(Model model, BooleanSupplier stop) {
    List<Domain> domains =
        IntStream.range(0, model.variables().size()).mapToObj(model.variables()::domain).toList();
    RootDomains root = new RootDomains(domains);
    for (Posting posting : model.lowered()) {
      posting.definitions().forEach(definition -> root.learn(definition.constraint()));
      posting.asserted().forEach(root::learn);
    }
    root.propagate(stop);
    return root.bounds.hasFailed() ? Optional.empty() : Optional.of(root.bounds.domains());
  }

  private void learn(Constraint constraint) {
    if (constraint instanceof Relation relation) {
      relation.accept(this);
    } else if (constraint instanceof Conditional conditional
        && conditional.when().equals(Atom.TRUE)
        && conditional.mode() != Conditional.Mode.ONLY_IF) {
      conditional.then().accept(this);
    }
  }

  @Override
  public Void linear(Linear relation) {
    if (relation.op() == Comparison.LE || relation.op() == Comparison.EQ) {
      rules.add(new AtMost(bounds, relation.sum(), 1, relation.bound()));
    }
    if (relation.op() == Comparison.GE || relation.op() == Comparison.EQ) {
      rules.add(new AtMost(bounds, relation.sum(), -1, -relation.bound()));
    }
    return null;
  }

  @Override
  public Void clause(Clause relation) {
    if (relation.atoms().size() == 1) {
      Atom atom = relation.atoms().get(0);
      switch (atom.op()) {
        case GE -> bounds.raise(atom.variable(), atom.value());
        case LE -> bounds.lower(atom.variable(), atom.value());
        case EQ -> {
          if (!atom.isConstant()) {
            bounds.keep(View.of(atom.variable()), IntStream.of(atom.value()));
          }
        }
        case NE -> {}
      }
    }
    return null;
  }

  @Override
  public Void maximum(Maximum relation) {
    rules.add(new Peak(bounds, relation));
    return null;
  }

  @Override
  public Void absolute(Absolute relation) {
    Views both = Views.of(relation.operand(), relation.operand().negated());
    return maximum(new Maximum(both, relation.result()));
  }

  @Override
  public Void element(Element relation) {
    within(relation.index(), relation.array().size());
    if (relation.isConstantArray()) {
      bounds.keep(relation.result(), relation.array().stream().mapToInt(View::offset));
    }
    return null;
  }

  @Override
  public Void table(Table relation) {
    Tuples rows = relation.rows();
    for (int c = 0; c < rows.arity(); c++) {
      int column = c;
      int[] values = IntStream.range(0, rows.size()).map(r -> rows.get(r, column)).toArray();
      if (relation.polarity() == Table.Polarity.ALLOWED
          && IntStream.of(values).noneMatch(value -> value == Tuples.ANY)) {
        bounds.keep(relation.scope().get(c), IntStream.of(values));
      }
    }
    return null;
  }

  @Override
  public Void binPacking(BinPacking relation) {
    relation.bins().stream().forEach(bin -> within(bin, relation.loads().size()));
    return null;
  }

  private void within(View view, int size) {
    bounds.raise(view, 0);
    bounds.lower(view, size - 1L);
  }

  @Override
  public Void allDifferent(AllDifferent relation) {
    return null;
  }

  @Override
  public Void noOverlap(NoOverlap relation) {
    return null;
  }

  @Override
  public Void cumulative(Cumulative relation) {
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
    if (relation.others() == GlobalCardinality.Others.FORBIDDEN) {
      relation.scope().stream().forEach(view -> bounds.keep(view, relation.values().stream()));
    }
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
  public Void product(Product relation) {
    return null;
  }

  @Override
  public Void division(Division relation) {
    return null;
  }

  @Override
  public Void modulo(Modulo relation) {
    return null;
  }

  @Override
  public Void lexicographic(Lexicographic relation) {
    return null;
  }

  @Override
  public Void inverse(Inverse relation) {
    relation.forward().stream().forEach(view -> within(view, relation.backward().size()));
    return null;
  }

  @Override
  public Void circuit(Circuit relation) {
    relation.successors().stream().forEach(view -> within(view, relation.successors().size()));
    return null;
  }

  @Override
  public Void subcircuit(Subcircuit relation) {
    relation.successors().stream().forEach(view -> within(view, relation.successors().size()));
    return null;
  }

  @Override
  public Void noOverlap2D(NoOverlap2D relation) {
    return null;
  }

  @Override
  public Void knapsack(Knapsack relation) {
    return null;
  }

  @Override
  public Void precedence(Precedence relation) {
    return null;
  }

  private void propagate(BooleanSupplier stop) {
    index();
    for (int r = 0; r < rules.size(); r++) {
      wake(r);
    }
    long visits = (long) VISITS_PER_RULE * rules.size();
    while (!open.isEmpty() && !bounds.hasFailed() && visits-- > 0) {
      if (visits % VISITS_BETWEEN_LOOKS == 0 && stop.getAsBoolean()) {
        return;
      }
      int rule = open.remove();
      isOpen.clear(rule);
      rules.get(rule).apply();
    }
  }

  private void index() {
    rules.forEach(rule -> rule.forEachVariable(v -> startAt[v + 1]++));
    for (int v = 1; v < startAt.length; v++) {
      startAt[v] += startAt[v - 1];
    }
    mentioning = new int[startAt[startAt.length - 1]];
    int[] next = Arrays.copyOf(startAt, startAt.length);
    for (int r = 0; r < rules.size(); r++) {
      int rule = r;
      rules.get(r).forEachVariable(v -> mentioning[next[v]++] = rule);
    }
  }

  private void wakeAll(int variable) {
    if (mentioning.length > 0) {
      for (int k = startAt[variable]; k < startAt[variable + 1]; k++) {
        wake(mentioning[k]);
      }
    }
  }

  private void wake(int rule) {
    if (!isOpen.get(rule)) {
      isOpen.set(rule);
      open.add(rule);
    }
  }

  /** Derives bounds from bounds. */
  private interface Rule {
    void apply();

    void forEachVariable(IntConsumer each);
  }

  /** {@code Σ sign·a·x ≤ most}: a term may exceed its minimum by at most the slack. */
  private record AtMost(Bounds bounds, LinearSum sum, int sign, long most) implements Rule {
    @Override
    public void forEachVariable(IntConsumer each) {
      sum.variables().stream().forEach(each);
    }

    @Override
    public void apply() {
      long slack = most;
      for (int i = 0; i < sum.size(); i++) {
        long a = sign * sum.coefficient(i);
        slack -= a * (a > 0 ? bounds.low(sum.variable(i)) : bounds.high(sum.variable(i)));
      }
      if (slack < 0) {
        bounds.fail();
        return;
      }
      for (int i = 0; i < sum.size(); i++) {
        long a = sign * sum.coefficient(i);
        int x = sum.variable(i);
        if (a > 0) {
          bounds.lower(x, bounds.low(x) + slack / a);
        } else {
          bounds.raise(x, bounds.high(x) + slack / a);
        }
      }
    }
  }

  /** No term passes the result, and the highest can reach it. */
  private record Peak(Bounds bounds, Maximum maximum) implements Rule {
    @Override
    public void forEachVariable(IntConsumer each) {
      Stream.concat(maximum.terms().stream(), Stream.of(maximum.result()))
          .filter(view -> !view.isConstant())
          .forEach(view -> each.accept(view.variable()));
    }

    @Override
    public void apply() {
      View result = maximum.result();
      long highest = Long.MIN_VALUE;
      for (int i = 0; i < maximum.terms().size(); i++) {
        View term = maximum.terms().get(i);
        bounds.raise(result, bounds.min(term));
        bounds.lower(term, bounds.max(result));
        highest = Math.max(highest, bounds.max(term));
      }
      bounds.lower(result, highest);
    }
  }
}
