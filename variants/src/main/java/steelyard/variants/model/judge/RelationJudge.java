package steelyard.variants.model.judge;

import java.util.Arrays;
import java.util.HashSet;
import java.util.OptionalInt;
import java.util.Set;
import java.util.stream.IntStream;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Assignment;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Count;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.Element;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Longs;
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
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.Views;

/** Whether a relation holds of an assignment, by the words of its definition. */
public final class RelationJudge implements RelationVisitor<Boolean> {
  private final Assignment values;

  /**
   * A judge of one assignment.
   *
   * @param values of every variable that a judged constraint mentions
   */
  public RelationJudge(Assignment values) {
    this.values = values;
  }

  public boolean holds(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      return conditional
          .mode()
          .holds(values.holds(conditional.when()), conditional.then().accept(this));
    }
    return ((Relation) constraint).accept(this);
  }

  @Override
  public Boolean linear(Linear relation) {
    return relation.op().holds(relation.sum().value(values), relation.bound());
  }

  @Override
  public Boolean clause(Clause relation) {
    return relation.atoms().stream().anyMatch(values::holds);
  }

  @Override
  public Boolean allDifferent(AllDifferent relation) {
    Set<Integer> seen = new HashSet<>();
    return IntStream.range(0, relation.scope().size())
        .allMatch(i -> seen.add(values.value(relation.scope(), i)));
  }

  @Override
  public Boolean element(Element relation) {
    int index = values.value(relation.index());
    return index >= 0
        && index < relation.array().size()
        && values.value(relation.array(), index) == values.value(relation.result());
  }

  @Override
  public Boolean table(Table relation) {
    boolean found =
        IntStream.range(0, relation.rows().size()).anyMatch(row -> matches(relation, row));
    return found == (relation.polarity() == Table.Polarity.ALLOWED);
  }

  private boolean matches(Table table, int row) {
    Tuples rows = table.rows();
    return IntStream.range(0, rows.arity())
        .allMatch(
            c ->
                rows.get(row, c) == Tuples.ANY
                    || rows.get(row, c) == values.value(table.scope(), c));
  }

  @Override
  public Boolean maximum(Maximum relation) {
    int largest =
        IntStream.range(0, relation.terms().size())
            .map(i -> values.value(relation.terms(), i))
            .max()
            .orElseThrow();
    return largest == values.value(relation.result());
  }

  @Override
  public Boolean noOverlap(NoOverlap relation) {
    Tasks tasks = relation.tasks();
    int[] present = present(tasks.presences());
    for (int a = 0; a < present.length; a++) {
      for (int b = a + 1; b < present.length; b++) {
        int i = present[a];
        int j = present[b];
        if (!areApart(tasks, i, j)) {
          return false;
        }
      }
    }
    return true;
  }

  @Override
  public Boolean cumulative(Cumulative relation) {
    int[] present = present(relation.tasks().presences());
    int capacity = values.value(relation.capacity());
    // The load only rises where a task starts.
    for (int i : present) {
      int time = values.value(relation.tasks().starts(), i);
      if (isRunning(relation, i, time) && load(relation, present, time) > capacity) {
        return false;
      }
    }
    return true;
  }

  private long load(Cumulative relation, int[] present, int time) {
    long load = 0;
    for (int i : present) {
      load += isRunning(relation, i, time) ? values.value(relation.demands(), i) : 0;
    }
    return load;
  }

  private boolean isRunning(Cumulative relation, int i, int time) {
    return values.value(relation.tasks().starts(), i) <= time
        && time < values.value(relation.tasks().ends(), i);
  }

  private int[] present(Atoms presences) {
    return IntStream.range(0, presences.size())
        .filter(i -> values.holds(presences.get(i)))
        .toArray();
  }

  @Override
  public Boolean binPacking(BinPacking relation) {
    long[] loads = new long[relation.loads().size()];
    for (int item = 0; item < relation.bins().size(); item++) {
      int bin = values.value(relation.bins(), item);
      if (bin < 0 || bin >= loads.length) {
        return false;
      }
      loads[bin] += relation.sizes().get(item);
    }
    return IntStream.range(0, loads.length)
        .allMatch(b -> loads[b] == values.value(relation.loads(), b));
  }

  /** Of two equal values both are the same excepted one. */
  @Override
  public Boolean allDifferentExcept(AllDifferentExcept relation) {
    Set<Integer> seen = new HashSet<>();
    return IntStream.range(0, relation.scope().size())
        .map(i -> values.value(relation.scope(), i))
        .filter(value -> !contains(relation.except(), value))
        .allMatch(seen::add);
  }

  private static boolean contains(Ints set, int value) {
    return set.stream().anyMatch(each -> each == value);
  }

  @Override
  public Boolean regular(Regular relation) {
    Automaton automaton = relation.automaton();
    OptionalInt state = OptionalInt.of(automaton.start());
    for (int i = 0; i < relation.word().size() && state.isPresent(); i++) {
      state = automaton.next(state.getAsInt(), values.value(relation.word(), i));
    }
    return state.isPresent() && automaton.accepts(state.getAsInt());
  }

  @Override
  public Boolean globalCardinality(GlobalCardinality relation) {
    boolean covered =
        relation.others() == GlobalCardinality.Others.ALLOWED
            || amount(relation.scope(), relation.values()) == relation.scope().size();
    return covered
        && IntStream.range(0, relation.values().size())
            .allMatch(
                k ->
                    amount(relation.scope(), Ints.of(relation.values().get(k)))
                        == values.value(relation.counts(), k));
  }

  @Override
  public Boolean count(Count relation) {
    long amount = amount(relation.scope(), relation.values());
    return relation.op().holds(amount, values.value(relation.bound()));
  }

  /** How many of the views have a value in {@code counted}. */
  private long amount(Views scope, Ints counted) {
    return row(scope).filter(value -> contains(counted, value)).count();
  }

  private IntStream row(Views views) {
    return IntStream.range(0, views.size()).map(i -> values.value(views, i));
  }

  @Override
  public Boolean distinctValues(DistinctValues relation) {
    long distinct = row(relation.scope()).distinct().count();
    return relation.op().holds(distinct, values.value(relation.bound()));
  }

  @Override
  public Boolean absolute(Absolute relation) {
    return Math.abs(values.value(relation.operand())) == values.value(relation.result());
  }

  @Override
  public Boolean product(Product relation) {
    long product = (long) values.value(relation.left()) * values.value(relation.right());
    return product == values.value(relation.result());
  }

  @Override
  public Boolean division(Division relation) {
    int divisor = values.value(relation.divisor());
    return divisor != 0
        && values.value(relation.dividend()) / divisor == values.value(relation.quotient());
  }

  @Override
  public Boolean modulo(Modulo relation) {
    int divisor = values.value(relation.divisor());
    return divisor != 0
        && values.value(relation.dividend()) % divisor == values.value(relation.remainder());
  }

  @Override
  public Boolean lexicographic(Lexicographic relation) {
    int order = Arrays.compare(row(relation.left()).toArray(), row(relation.right()).toArray());
    return order < 0 || (order == 0 && relation.ties() == Lexicographic.Ties.ALLOWED);
  }

  @Override
  public Boolean inverse(Inverse relation) {
    int[] forward = row(relation.forward()).toArray();
    int[] backward = row(relation.backward()).toArray();
    return IntStream.range(0, forward.length)
        .allMatch(i -> isNode(forward[i], backward.length) && backward[forward[i]] == i);
  }

  private static boolean isNode(int value, int nodes) {
    return value >= 0 && value < nodes;
  }

  @Override
  public Boolean circuit(Circuit relation) {
    int nodes = relation.successors().size();
    return nodes == 0 || tour(relation.successors(), 0) == nodes;
  }

  @Override
  public Boolean subcircuit(Subcircuit relation) {
    int[] successors = row(relation.successors()).toArray();
    int[] inside = IntStream.range(0, successors.length).filter(i -> successors[i] != i).toArray();
    return inside.length == 0 || tour(relation.successors(), inside[0]) == inside.length;
  }

  /** How many nodes lie on the round tour that starts at a node; 0 if it does not return. */
  private int tour(Views successors, int start) {
    int at = start;
    for (int steps = 1; steps <= successors.size(); steps++) {
      at = values.value(successors, at);
      if (at == start) {
        return steps;
      }
      if (!isNode(at, successors.size())) {
        return 0;
      }
    }
    return 0;
  }

  @Override
  public Boolean noOverlap2D(NoOverlap2D relation) {
    int[] present =
        IntStream.of(present(relation.across().presences()))
            .filter(i -> values.holds(relation.up().presences().get(i)))
            .toArray();
    for (int a = 0; a < present.length; a++) {
      for (int b = a + 1; b < present.length; b++) {
        if (!areApart(relation.across(), present[a], present[b])
            && !areApart(relation.up(), present[a], present[b])) {
          return false;
        }
      }
    }
    return true;
  }

  private boolean areApart(Tasks tasks, int i, int j) {
    return values.value(tasks.ends(), i) <= values.value(tasks.starts(), j)
        || values.value(tasks.ends(), j) <= values.value(tasks.starts(), i);
  }

  @Override
  public Boolean knapsack(Knapsack relation) {
    return total(relation.weights(), relation.amounts()) <= values.value(relation.capacity())
        && total(relation.profits(), relation.amounts()) >= values.value(relation.profit());
  }

  private long total(Longs factors, Views amounts) {
    return IntStream.range(0, amounts.size())
        .mapToLong(i -> factors.get(i) * values.value(amounts, i))
        .sum();
  }

  @Override
  public Boolean precedence(Precedence relation) {
    int[] row = row(relation.scope()).toArray();
    return IntStream.range(1, relation.values().size())
        .allMatch(k -> precedes(row, relation.values().get(k - 1), relation.values().get(k)));
  }

  private static boolean precedes(int[] row, int first, int then) {
    int[] places = IntStream.range(0, row.length).filter(i -> row[i] == then).toArray();
    return places.length == 0 || IntStream.range(0, places[0]).anyMatch(i -> row[i] == first);
  }
}
