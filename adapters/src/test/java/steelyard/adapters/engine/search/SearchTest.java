package steelyard.adapters.engine.search;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Stop;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.propagators.Relations;
import steelyard.adapters.engine.propagators.Sum;

class SearchTest {
  /** n queens by disequalities: column of the queen in each row. */
  private static final class Queens {
    final Store store = new Store();
    final Network network = new Network(store);
    final Scope column;

    Queens(int n) {
      int[] q = new int[n];
      for (int i = 0; i < n; i++) {
        q[i] = store.variable(0, n - 1);
      }
      column = Scope.of(q);
      Relations relations = new Relations(network);
      for (int i = 0; i < n; i++) {
        for (int j = i + 1; j < n; j++) {
          Sum difference = Sum.of(store, new long[] {1, -1}, Scope.of(q[i], q[j]));
          for (int d : new int[] {0, i - j, j - i}) {
            relations.unequal(0, Atom.TRUE, difference, d);
          }
        }
      }
    }

    Ordered by(VariableOrder order, ValueOrder values, long seed) {
      return new Ordered(network, column, order, values, seed);
    }

    List<Integer> solution(Store s) {
      List<Integer> columns = new ArrayList<>();
      for (int i = 0; i < column.size(); i++) {
        columns.add(column.min(s, i));
      }
      return columns;
    }
  }

  /** Number of solutions for n = 1..9: OEIS A000170. */
  @Test
  void findsAllQueens() {
    long[] published = {1, 0, 0, 2, 10, 4, 40, 92, 352};
    for (int n = 1; n <= published.length; n++) {
      Queens queens = new Queens(n);
      Search search =
          new Search(queens.network, queens.by(VariableOrder.SMALLEST_DOMAIN, ValueOrder.MIN, 0));
      assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
      assertThat(search.counters().solutions()).as("n = %d", n).isEqualTo(published[n - 1]);
    }
  }

  static Stream<VariableOrder> variableOrders() {
    return Stream.of(VariableOrder.values());
  }

  @ParameterizedTest
  @MethodSource("variableOrders")
  void findsEachSolutionOnce_whateverTheOrder(VariableOrder order) {
    for (ValueOrder values : ValueOrder.values()) {
      for (long seed = 0; seed < 3; seed++) {
        Queens queens = new Queens(6);
        Set<List<Integer>> found = new HashSet<>();
        Search search =
            new Search(queens.network, queens.by(order, values, seed))
                .onSolution(s -> found.add(queens.solution(s)));
        assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
        assertThat(found).hasSize(4);
        assertThat(search.counters().solutions()).isEqualTo(4);
      }
    }
  }

  @Test
  void triesValuesInTheOrderAsked() {
    assertThat(firstDecision(ValueOrder.MIN)).isEqualTo("[-x1 ≥ 0]");
    assertThat(firstDecision(ValueOrder.MAX)).isEqualTo("[x1 ≥ 9]");
    assertThat(firstDecision(ValueOrder.MEDIAN)).isEqualTo("[x1 = 4]");
    assertThat(firstDecision(ValueOrder.LOWER_HALF)).isEqualTo("[-x1 ≥ -4]");
    assertThat(firstDecision(ValueOrder.UPPER_HALF)).isEqualTo("[x1 ≥ 5]");
  }

  private static String firstDecision(ValueOrder values) {
    Store s = new Store();
    int x = s.variable(0, 9);
    Ordered brancher = new Ordered(new Network(s), Scope.of(x), VariableOrder.INPUT, values, 0);
    return Atom.show(brancher.next(s));
  }

  @Test
  void takesTheMedianOfTheValuesThatAreLeft() {
    Store s = new Store();
    int x = s.variable(0, 9);
    Ordered brancher =
        new Ordered(new Network(s), Scope.of(x), VariableOrder.INPUT, ValueOrder.MEDIAN, 0);
    for (int v = 1; v <= 6; v++) {
      assertThat(s.remove(x, v, 0)).isTrue();
    }
    assertThat(Atom.show(brancher.next(s))).isEqualTo("[x1 = 7]");
  }

  @Test
  void picksVariablesInTheOrderAsked() {
    assertThat(firstVariable(VariableOrder.INPUT)).isEqualTo(1);
    assertThat(firstVariable(VariableOrder.SMALLEST_DOMAIN)).isEqualTo(3);
    assertThat(firstVariable(VariableOrder.LARGEST_DOMAIN)).isEqualTo(2);
    assertThat(firstVariable(VariableOrder.SMALLEST_MIN)).isEqualTo(4);
    assertThat(firstVariable(VariableOrder.LARGEST_MAX)).isEqualTo(2);
    assertThat(firstVariable(VariableOrder.WEIGHTED_DEGREE)).isEqualTo(1);
  }

  private static int firstVariable(VariableOrder order) {
    Store s = new Store();
    int w = s.variable(2, 5);
    int x = s.variable(1, 9);
    int y = s.variable(3, 4);
    int z = s.variable(0, 6);
    Network network = new Network(s);
    Ordered brancher = new Ordered(network, Scope.of(w, x, y, z), order, ValueOrder.MIN, 0);
    network.clause(0, Atom.ge(w, 3), Atom.ge(x, 2));
    network.clause(0, Atom.ge(w, 4), Atom.ge(x, 3));
    assertThat(network.propagate()).isTrue();
    return Atom.variable(brancher.next(s));
  }

  @Test
  void endsAfterExactlyTheWorkAllowed() {
    Queens nodes = new Queens(8);
    Search byNodes = new Search(nodes.network, nodes.by(VariableOrder.INPUT, ValueOrder.MIN, 0));
    assertThat(byNodes.run(Limits.NONE.withNodes(37), Stop.NEVER)).isEqualTo(Ending.NODES);
    assertThat(byNodes.counters().nodes()).isEqualTo(37);
    Queens failures = new Queens(8);
    Search byFailures =
        new Search(failures.network, failures.by(VariableOrder.INPUT, ValueOrder.MIN, 0));
    assertThat(byFailures.run(Limits.NONE.withFailures(21), Stop.NEVER)).isEqualTo(Ending.FAILURES);
    assertThat(byFailures.counters().failures()).isEqualTo(21);
    Queens solutions = new Queens(8);
    Search bySolutions =
        new Search(solutions.network, solutions.by(VariableOrder.INPUT, ValueOrder.MIN, 0));
    assertThat(bySolutions.run(Limits.NONE.withSolutions(5), Stop.NEVER))
        .isEqualTo(Ending.SOLUTIONS);
    assertThat(bySolutions.counters().solutions()).isEqualTo(5);
  }

  @Test
  void stopsWhenAsked() {
    Queens queens = new Queens(12);
    long[] polls = {0};
    Search search = new Search(queens.network, queens.by(VariableOrder.INPUT, ValueOrder.MIN, 0));
    assertThat(search.run(Limits.NONE, () -> ++polls[0] > 10)).isEqualTo(Ending.STOPPED);
    assertThat(search.counters().propagations()).isLessThan(11 * 256);
  }

  @Test
  void countsTheSameInEveryRun() {
    assertThat(automaticRun(7)).isEqualTo(automaticRun(7));
    assertThat(automaticRun(7)).isNotEqualTo(automaticRun(8));
  }

  private static Counters automaticRun(long seed) {
    Queens queens = new Queens(12);
    Search search =
        new Search(queens.network, new Automatic(queens.network, Optional.empty(), seed))
            .restarting(Restarts.luby(10));
    search.run(Limits.NONE.withSolutions(1), Stop.NEVER);
    return search.counters();
  }

  @Test
  void provesThatThereIsNoSolution_despiteRestarts() {
    Store s = new Store();
    Network network = new Network(s);
    Relations relations = new Relations(network);
    int n = 6;
    int[] hole = new int[n];
    for (int i = 0; i < n; i++) {
      hole[i] = s.variable(0, n - 2);
      for (int j = 0; j < i; j++) {
        Sum difference = Sum.of(s, new long[] {1, -1}, Scope.of(hole[i], hole[j]));
        relations.unequal(0, Atom.TRUE, difference, 0);
      }
    }
    Search search =
        new Search(network, new Automatic(network, Optional.empty(), 0))
            .restarting(Restarts.luby(2));
    assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
    assertThat(search.counters().solutions()).isZero();
    assertThat(search.counters().restarts()).isPositive();
  }

  @Test
  void findsOneSolutionPerAssignmentOfTheProjection() {
    Queens queens = new Queens(8);
    Set<List<Integer>> seen = new HashSet<>();
    Scope firstTwo = queens.column.rows(0, 2);
    Search search =
        new Search(queens.network, queens.by(VariableOrder.INPUT, ValueOrder.MIN, 0))
            .projectedOn(
                new Ordered(
                    queens.network, firstTwo, VariableOrder.SMALLEST_DOMAIN, ValueOrder.MAX, 0))
            .onSolution(s -> seen.add(List.of(firstTwo.min(s, 0), firstTwo.min(s, 1))));
    assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
    Set<List<Integer>> all = new HashSet<>();
    Queens again = new Queens(8);
    new Search(again.network, again.by(VariableOrder.INPUT, ValueOrder.MIN, 0))
        .onSolution(
            s -> {
              all.add(again.solution(s).subList(0, 2));
              return true;
            })
        .run(Limits.NONE, Stop.NEVER);
    assertThat(seen).isEqualTo(all);
    assertThat(search.counters().solutions()).isEqualTo(all.size());
  }

  private enum Way {
    ORDERED,
    AUTOMATIC,
    RESTARTING
  }

  /** Least Σ (i+1)·column[i] over all 6-queens solutions, by looking at all of them. */
  @ParameterizedTest
  @EnumSource(Way.class)
  void findsTheOptimum_andProvesIt(Way way) {
    long[] weights = {1, 2, 3, 4, 5, 6};
    Queens all = new Queens(6);
    long[] best = {Long.MAX_VALUE};
    Sum sumOfAll = Sum.of(all.store, weights, all.column);
    new Search(all.network, all.by(VariableOrder.INPUT, ValueOrder.MIN, 0))
        .onSolution(
            s -> {
              best[0] = Math.min(best[0], sumOfAll.min(s));
              return true;
            })
        .run(Limits.NONE, Stop.NEVER);

    Queens queens = new Queens(6);
    Objective objective =
        Objective.minimise(queens.network, Sum.of(queens.store, weights, queens.column), 1);
    Brancher brancher =
        way == Way.ORDERED
            ? queens.by(VariableOrder.INPUT, ValueOrder.MAX, 0)
            : new Automatic(queens.network, Optional.of(objective), 0);
    List<Long> values = new ArrayList<>();
    Search search =
        new Search(queens.network, brancher)
            .minimising(objective)
            .restarting(way == Way.RESTARTING ? Restarts.geometric(1, 1.2) : Restarts.never())
            .onSolution(s -> values.add(objective.least(s)));
    assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
    assertThat(search.bound()).isEqualTo(OptionalLong.of(best[0]));
    assertThat(values.get(values.size() - 1)).isEqualTo(best[0]);
    for (int i = 1; i < values.size(); i++) {
      assertThat(values.get(i)).isLessThan(values.get(i - 1));
    }
  }

  @Test
  void boundsTheObjectiveFromTheRoot_whenTheSearchIsCutOff() {
    Queens queens = new Queens(8);
    Sum sum = Sum.of(queens.store, queens.column.rows(0, 2));
    Objective objective = Objective.minimise(queens.network, sum, 1);
    Search search =
        new Search(queens.network, queens.by(VariableOrder.INPUT, ValueOrder.MAX, 0))
            .minimising(objective);
    assertThat(search.run(Limits.NONE.withNodes(1), Stop.NEVER)).isEqualTo(Ending.NODES);
    assertThat(search.bound()).isEqualTo(OptionalLong.of(0));
  }

  @Test
  void saysThatTheRootHasNoSolution() {
    Store s = new Store();
    Network network = new Network(s);
    network.clause(0, Atom.FALSE);
    Search search = new Search(network, new Automatic(network, Optional.empty(), 0));
    assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
    assertThat(search.counters().solutions()).isZero();
    assertThat(search.bound()).isEmpty();
  }

  @Test
  void runsThroughPhases_eachAfterTheOneBefore() {
    Queens queens = new Queens(6);
    Brancher phases =
        new Phases(
            List.of(
                new Ordered(
                    queens.network,
                    queens.column.rows(3, 6),
                    VariableOrder.INPUT,
                    ValueOrder.MAX,
                    0),
                queens.by(VariableOrder.SMALLEST_DOMAIN, ValueOrder.MIN, 0)));
    assertThat(queens.network.propagate()).isTrue();
    assertThat(Atom.variable(phases.next(queens.store))).isEqualTo(4);
    Search search = new Search(queens.network, phases);
    assertThat(search.run(Limits.NONE, Stop.NEVER)).isEqualTo(Ending.EXHAUSTED);
    assertThat(search.counters().solutions()).isEqualTo(4);
  }
}
