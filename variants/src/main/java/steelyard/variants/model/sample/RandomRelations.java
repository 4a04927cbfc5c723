package steelyard.variants.model.sample;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.function.Supplier;
import java.util.stream.IntStream;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Table;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Random small relations of every kind for exhaustive checks: holes and negative values in domains,
 * constants and repeated variables in scopes, indices outside arrays, empty tables, absent tasks.
 */
public final class RandomRelations {
  /** The names of the kinds, as {@link Relation#kind()} gives them. */
  public static final List<String> KINDS =
      List.of(
          "linear",
          "clause",
          "all-different",
          "all-different-except",
          "element",
          "table",
          "regular",
          "global-cardinality",
          "count",
          "distinct-values",
          "maximum",
          "absolute",
          "product",
          "division",
          "modulo",
          "lexicographic",
          "inverse",
          "circuit",
          "subcircuit",
          "no-overlap",
          "no-overlap-2d",
          "cumulative",
          "bin-packing",
          "knapsack",
          "precedence");

  private final SplittableRandom random;
  private final List<Domain> domains;

  /** Relations over {@code variables} new random domains. */
  public RandomRelations(long seed, int variables) {
    this.random = new SplittableRandom(seed);
    this.domains = List.copyOf(some(variables, this::domain));
  }

  /** Relations over variables of the given domains, drawn from a generator that others share. */
  RandomRelations(SplittableRandom random, List<Domain> domains) {
    this.random = random;
    this.domains = List.copyOf(domains);
  }

  /** A domain as those of variables are drawn. */
  static Domain domain(SplittableRandom random) {
    return new RandomRelations(random, List.of()).domain();
  }

  public List<Domain> domains() {
    return domains;
  }

  public Relation relation(String kind) {
    return switch (kind) {
      case "linear" -> linear();
      case "clause" -> new Clause(Atoms.of(some(random.nextInt(4), this::atom)));
      case "all-different" -> new AllDifferent(views(random.nextInt(5)));
      case "all-different-except" -> new AllDifferentExcept(views(random.nextInt(5)), values(3));
      case "element" -> new Element(views(random.nextInt(5)), view(), view());
      case "table" -> table();
      case "regular" -> new Regular(views(random.nextInt(5)), automaton());
      case "global-cardinality" -> globalCardinality();
      case "count" -> new Count(views(random.nextInt(5)), values(4), comparison(), view());
      case "distinct-values" -> new DistinctValues(views(random.nextInt(5)), comparison(), view());
      case "maximum" -> new Maximum(views(1 + random.nextInt(4)), view());
      case "absolute" -> new Absolute(view(), view());
      case "product" -> new Product(view(), view(), view());
      case "division" -> new Division(view(), view(), view());
      case "modulo" -> new Modulo(view(), view(), view());
      case "lexicographic" -> lexicographic(random.nextInt(4));
      case "inverse" -> new Inverse(views(random.nextInt(4)), views(random.nextInt(5)));
      case "circuit" -> new Circuit(nodes(random.nextInt(5)));
      case "subcircuit" -> new Subcircuit(nodes(random.nextInt(5)));
      case "no-overlap" -> new NoOverlap(tasks(random.nextInt(4)));
      case "no-overlap-2d" -> noOverlap2D(random.nextInt(4));
      case "cumulative" -> cumulative(random.nextInt(4));
      case "bin-packing" -> binPacking(random.nextInt(5), random.nextInt(4));
      case "knapsack" -> knapsack(random.nextInt(4));
      case "precedence" -> new Precedence(views(random.nextInt(6)), values(4));
      default -> throw new IllegalArgumentException(kind);
    };
  }

  /** Often a literal of a variable, at times a constant. */
  public Atom atom() {
    if (random.nextInt(6) == 0) {
      return Atom.constant(random.nextBoolean());
    }
    Atom.Op op = pick(List.of(Atom.Op.values()));
    return new Atom(random.nextInt(domains.size()), op, between(-4, 5));
  }

  private Domain domain() {
    return switch (random.nextInt(4)) {
      case 0 -> Domain.BOOLEAN;
      case 1 -> Domain.of(IntStream.range(0, 3).map(i -> between(-3, 4)));
      default -> {
        int min = between(-2, 2);
        yield Domain.between(min, min + random.nextInt(4));
      }
    };
  }

  private Relation linear() {
    int[] scope = IntStream.range(0, domains.size()).filter(v -> random.nextInt(4) > 0).toArray();
    long[] factors = new long[scope.length];
    boolean unit = random.nextBoolean();
    for (int i = 0; i < factors.length; i++) {
      long size = unit ? 1 : between(1, 4);
      factors[i] = random.nextBoolean() ? size : -size;
    }
    return new Linear(
        new LinearSum(Ints.of(scope), Longs.of(factors), 0), comparison(), between(-6, 8));
  }

  private Comparison comparison() {
    return pick(List.of(Comparison.values()));
  }

  /** Some of the values -1..3, in any order. */
  private Ints values(int most) {
    List<Integer> left = new ArrayList<>(List.of(-1, 0, 1, 2, 3));
    int size = random.nextInt(most + 1);
    return Ints.of(
        IntStream.range(0, size).map(i -> left.remove(random.nextInt(left.size()))).toArray());
  }

  private Automaton automaton() {
    int states = 1 + random.nextInt(3);
    List<int[]> transitions = new ArrayList<>();
    for (int state = 0; state < states; state++) {
      for (int value = -1; value < 4; value++) {
        if (random.nextInt(3) > 0) {
          transitions.add(new int[] {state, value, random.nextInt(states)});
        }
      }
    }
    Ints accepting =
        Ints.of(IntStream.range(0, states).filter(q -> random.nextBoolean()).toArray());
    return new Automaton(states, random.nextInt(states), accepting, Tuples.of(3, transitions));
  }

  private Relation globalCardinality() {
    Ints values = values(3);
    GlobalCardinality.Others others = pick(List.of(GlobalCardinality.Others.values()));
    return new GlobalCardinality(views(random.nextInt(5)), values, views(values.size()), others);
  }

  private Relation lexicographic(int size) {
    return new Lexicographic(views(size), views(size), pick(List.of(Lexicographic.Ties.values())));
  }

  /** Mostly views of nodes, so that some of the relations hold. */
  private Views nodes(int size) {
    return Views.of(
        some(size, () -> random.nextInt(4) == 0 ? View.constant(random.nextInt(size)) : view()));
  }

  private Relation noOverlap2D(int boxes) {
    return new NoOverlap2D(tasks(boxes), tasks(boxes));
  }

  private Relation knapsack(int items) {
    return new Knapsack(views(items), longs(items), view(), longs(items), view());
  }

  private Longs longs(int size) {
    return Longs.of(IntStream.range(0, size).mapToLong(i -> between(-2, 4)).toArray());
  }

  private Relation table() {
    int arity = random.nextInt(4);
    List<int[]> rows = some(random.nextInt(6), () -> row(arity));
    Table.Polarity polarity =
        random.nextBoolean() ? Table.Polarity.ALLOWED : Table.Polarity.FORBIDDEN;
    return new Table(views(arity), Tuples.of(arity, rows), polarity);
  }

  private int[] row(int arity) {
    return IntStream.range(0, arity)
        .map(c -> random.nextInt(5) == 0 ? Tuples.ANY : between(-2, 3))
        .toArray();
  }

  private Relation cumulative(int tasks) {
    Views demands = Views.of(some(tasks, this::amount));
    return new Cumulative(tasks(tasks), demands, random.nextBoolean() ? amount() : view());
  }

  private Relation binPacking(int items, int bins) {
    long[] sizes = new long[items];
    for (int i = 0; i < items; i++) {
      sizes[i] = random.nextInt(4);
    }
    return new BinPacking(
        Views.of(some(items, this::amount)),
        Longs.of(sizes),
        Views.of(some(bins, () -> random.nextInt(3) == 0 ? amount() : view())));
  }

  private Tasks tasks(int size) {
    return Tasks.of(some(size, this::task));
  }

  private Task task() {
    View start = view();
    View duration = amount();
    View end =
        duration.isConstant() && random.nextInt(4) > 0 ? start.shifted(duration.offset()) : view();
    return new Task(start, duration, end, random.nextBoolean() ? Atom.TRUE : atom());
  }

  private Views views(int size) {
    return Views.of(some(size, this::view));
  }

  private View view() {
    if (random.nextInt(6) == 0) {
      return View.constant(between(-2, 3));
    }
    View view = View.of(random.nextInt(domains.size()));
    return switch (random.nextInt(4)) {
      case 0 -> view.negated().shifted(between(-1, 3));
      case 1 -> view.shifted(between(-2, 2));
      default -> view;
    };
  }

  /** A view that is never negative. */
  private View amount() {
    if (random.nextBoolean()) {
      return View.constant(random.nextInt(4));
    }
    int variable = random.nextInt(domains.size());
    Domain domain = domains.get(variable);
    return random.nextInt(3) == 0
        ? View.of(variable).negated().shifted(domain.max())
        : View.of(variable).shifted(Math.max(0, -domain.min()));
  }

  private <T> T pick(List<T> choices) {
    return choices.get(random.nextInt(choices.size()));
  }

  private int between(int low, int high) {
    return low + random.nextInt(high - low + 1);
  }

  private static <T> List<T> some(int size, Supplier<T> one) {
    List<T> list = new ArrayList<>();
    for (int i = 0; i < size; i++) {
      list.add(one.get());
    }
    return list;
  }
}
