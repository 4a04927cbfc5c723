package steelyard.variants.model.judge;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferentExcept;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Circuit;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.GlobalCardinality.Others;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Inverse;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Lexicographic.Ties;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.NoOverlap2D.Box;
import steelyard.variants.model.Precedence;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Subcircuit;
import steelyard.variants.model.Task;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Each kind against a definition of its own, written here in plain Java in other words than the
 * judge's, on every assignment of four variables with values -1..3.
 */
class RelationJudgeTest {
  private static final View A = View.of(0);
  private static final View B = View.of(1);
  private static final View C = View.of(2);
  private static final View D = View.of(3);
  private static final Views NONE = Views.of();

  private static void assertMeans(Relation relation, Predicate<int[]> plain) {
    int[] x = new int[4];
    for (int code = 0; code < 5 * 5 * 5 * 5; code++) {
      int rest = code;
      for (int i = 0; i < x.length; i++) {
        x[i] = rest % 5 - 1;
        rest /= 5;
      }
      assertThat(new RelationJudge(v -> x[v]).holds(relation))
          .as("%s of %s", relation, Arrays.toString(x))
          .isEqualTo(plain.test(x));
    }
  }

  private static boolean holds(Relation relation) {
    return new RelationJudge(
            v -> {
              throw new AssertionError("nothing to look at");
            })
        .holds(relation);
  }

  @Test
  void differs_except_for_some_values() {
    assertMeans(
        AllDifferentExcept.of(Views.of(A, B, C), 0),
        x ->
            (x[0] != x[1] || x[0] == 0)
                && (x[0] != x[2] || x[0] == 0)
                && (x[1] != x[2] || x[1] == 0));
    assertMeans(AllDifferentExcept.of(Views.of(A, A), 3, -1), x -> x[0] == 3 || x[0] == -1);
    assertMeans(AllDifferentExcept.of(Views.of(A, B.negated())), x -> x[0] != -x[1]);
    assertThat(holds(AllDifferentExcept.of(NONE, 1))).isTrue();
  }

  /** Words of 0 and 1 without 11, as a regular expression of java.util.regex says it. */
  @Test
  void accepts_what_the_regular_expression_matches() {
    Automaton noPair =
        Automaton.of(
            2, Ints.of(0, 1), new int[] {0, 0, 0}, new int[] {0, 1, 1}, new int[] {1, 0, 0});
    assertMeans(
        new Regular(Views.of(A, B, C.negated().shifted(1), D), noPair),
        x ->
            IntStream.of(x[0], x[1], 1 - x[2], x[3])
                .mapToObj(v -> v == 0 || v == 1 ? Integer.toString(v) : "x")
                .collect(Collectors.joining())
                .matches("(0|10)*1?"));
    assertThat(holds(new Regular(NONE, noPair))).isTrue();
    assertThat(holds(new Regular(NONE, Automaton.of(2, Ints.of(1))))).isFalse();
  }

  @ParameterizedTest
  @EnumSource(Others.class)
  void counts_each_of_some_values(Others others) {
    boolean closed = others == Others.FORBIDDEN;
    assertMeans(
        new GlobalCardinality(
            Views.of(A, B, B), Ints.of(2, 0), Views.of(C, View.constant(1)), others),
        x -> {
          String row = "" + (char) ('b' + x[0]) + (char) ('b' + x[1]) + (char) ('b' + x[1]);
          return row.replace("d", "").length() == 3 - x[2]
              && row.replace("b", "").length() == 2
              && (!closed || row.matches("[bd]*"));
        });
    assertThat(holds(new GlobalCardinality(NONE, Ints.of(4), Views.ofConstants(0), others)))
        .isTrue();
    assertThat(holds(new GlobalCardinality(NONE, Ints.of(4), Views.ofConstants(1), others)))
        .isFalse();
    assertThat(holds(new GlobalCardinality(Views.ofConstants(4), Ints.of(), NONE, others)))
        .isEqualTo(!closed);
  }

  @ParameterizedTest
  @EnumSource(Comparison.class)
  void counts_values_of_a_set(Comparison op) {
    assertMeans(
        new Count(Views.of(A, B, A), Ints.of(3, 1), op, D),
        x ->
            op.holds((x[0] % 2 == 0 || x[0] < 0 ? 0 : 2) + (x[1] == 1 || x[1] == 3 ? 1 : 0), x[3]));
    assertThat(holds(new Count(Views.ofConstants(5, 5), Ints.of(), op, View.constant(0))))
        .isEqualTo(op.holds(0, 0));
    assertThat(holds(new Count(NONE, Ints.of(1), op, View.constant(0)))).isEqualTo(op.holds(0, 0));
  }

  @ParameterizedTest
  @EnumSource(Comparison.class)
  void counts_different_values(Comparison op) {
    assertMeans(
        new DistinctValues(Views.of(A, B, C), op, D),
        x -> {
          int pairs = (x[0] == x[1] ? 1 : 0) + (x[1] == x[2] ? 1 : 0) + (x[0] == x[2] ? 1 : 0);
          return op.holds(pairs == 0 ? 3 : pairs == 1 ? 2 : 1, x[3]);
        });
    assertThat(holds(new DistinctValues(NONE, op, View.constant(0)))).isEqualTo(op.holds(0, 0));
  }

  @Test
  void takes_magnitudes_products_quotients_and_remainders() {
    assertMeans(new Absolute(A, B), x -> x[1] >= 0 && x[1] * x[1] == x[0] * x[0]);
    assertMeans(new Product(A, B, C), x -> x[2] == multiplied(x[0], x[1]));
    assertMeans(
        new Division(A.shifted(2), B, C), x -> x[1] != 0 && x[2] == truncated(x[0] + 2, x[1]));
    assertMeans(
        new Modulo(A.negated(), B, C),
        x -> x[1] != 0 && x[2] == -x[0] - multiplied(x[1], truncated(-x[0], x[1])));
  }

  private static int multiplied(int a, int b) {
    int sum = IntStream.range(0, Math.abs(b)).map(i -> a).sum();
    return b < 0 ? -sum : sum;
  }

  private static int truncated(int a, int b) {
    double exact = (double) a / b;
    return (int) (exact < 0 ? Math.ceil(exact) : Math.floor(exact));
  }

  /** The examples of the Java Language Specification, 15.17.3, and their quotients. */
  @ParameterizedTest
  @CsvSource({"5, 3, 1, 2", "5, -3, -1, 2", "-5, 3, -1, -2", "-5, -3, 1, -2"})
  void divides_as_the_language_specification_says(int x, int y, int quotient, int remainder) {
    View dividend = View.constant(x);
    View divisor = View.constant(y);
    for (int v = -3; v <= 3; v++) {
      View value = View.constant(v);
      assertThat(holds(new Division(dividend, divisor, value))).isEqualTo(v == quotient);
      assertThat(holds(new Modulo(dividend, divisor, value))).isEqualTo(v == remainder);
      assertThat(holds(new Division(dividend, View.constant(0), value))).isFalse();
      assertThat(holds(new Modulo(dividend, View.constant(0), value))).isFalse();
    }
  }

  @Test
  void compares_rows_as_numbers_of_two_digits() {
    for (Ties ties : Ties.values()) {
      int least = ties == Ties.ALLOWED ? 0 : 1;
      Lexicographic relation = new Lexicographic(Views.of(A, B), Views.of(C, D), ties);
      assertMeans(relation, x -> 10 * x[2] + x[3] - 10 * x[0] - x[1] >= least);
      assertMeans(relation.negation(), x -> 10 * x[2] + x[3] - 10 * x[0] - x[1] < least);
      assertThat(holds(new Lexicographic(NONE, NONE, ties))).isEqualTo(ties == Ties.ALLOWED);
    }
  }

  @Test
  void leads_back() {
    assertMeans(
        new Inverse(Views.of(A, B), Views.of(C, D)),
        x ->
            (x[0] == 0 && x[1] == 1 && x[2] == 0 && x[3] == 1)
                || (x[0] == 1 && x[1] == 0 && x[2] == 1 && x[3] == 0));
    assertMeans(
        new Inverse(Views.of(A), Views.of(B, C)),
        x -> (x[0] == 0 && x[1] == 0) || (x[0] == 1 && x[2] == 0));
    assertMeans(new Inverse(Views.of(A, B), Views.of(C)), x -> false);
    assertMeans(new Inverse(NONE, Views.of(C)), x -> true);
  }

  @Test
  void goes_round_all_nodes() {
    assertMeans(new Circuit(Views.of(A, B, C, D)), x -> tours(4, 4).contains(Ints.of(x)));
    assertMeans(
        new Circuit(Views.of(A, B, C.shifted(-1))),
        x -> tours(3, 3).contains(Ints.of(x[0], x[1], x[2] - 1)));
    assertMeans(new Circuit(Views.of(B, B)), x -> false);
    assertMeans(new Circuit(Views.of(B)), x -> x[1] == 0);
    assertThat(holds(new Circuit(NONE))).isTrue();
  }

  @Test
  void goes_round_some_nodes() {
    Set<Ints> all = new HashSet<>(Set.of(Ints.of(0, 1, 2, 3)));
    IntStream.rangeClosed(2, 4).forEach(visited -> all.addAll(tours(4, visited)));
    assertMeans(new Subcircuit(Views.of(A, B, C, D)), x -> all.contains(Ints.of(x)));
    assertMeans(new Subcircuit(Views.of(B)), x -> x[1] == 0);
    assertMeans(new Subcircuit(Views.of(A, View.constant(1))), x -> x[0] == 0);
    assertThat(holds(new Subcircuit(NONE))).isTrue();
  }

  /** The successors of every tour of {@code visited} of {@code nodes}, the others their own. */
  private static Set<Ints> tours(int nodes, int visited) {
    Set<Ints> tours = new HashSet<>();
    extend(nodes, visited, List.of(), tours);
    return tours;
  }

  private static void extend(int nodes, int visited, List<Integer> tour, Set<Ints> tours) {
    if (tour.size() == visited) {
      int[] successors = IntStream.range(0, nodes).toArray();
      for (int k = 0; k < visited; k++) {
        successors[tour.get(k)] = tour.get((k + 1) % visited);
      }
      tours.add(Ints.of(successors));
      return;
    }
    for (int node = 0; node < nodes; node++) {
      if (!tour.contains(node)) {
        List<Integer> longer = new ArrayList<>(tour);
        longer.add(node);
        extend(nodes, visited, longer, tours);
      }
    }
  }

  @Test
  void keeps_boxes_apart() {
    NoOverlap2D boxes =
        NoOverlap2D.of(
            new Box(Task.fixed(A, 2), Task.fixed(B, 1)),
            new Box(Task.fixed(C, 1), Task.fixed(D, 3)));
    assertMeans(boxes, x -> !shareACell(x[0], 2, x[1], 1, x[2], 1, x[3], 3));
    NoOverlap2D thin =
        NoOverlap2D.of(
            new Box(Task.fixed(A, 3), Task.fixed(B, 2)),
            new Box(Task.fixed(C, 0), Task.fixed(D, 1)));
    assertMeans(thin, x -> !(x[0] < x[2] && x[2] < x[0] + 3 && x[1] - 1 < x[3] && x[3] < x[1] + 2));
    Task optional = new Task(C, View.constant(9), C.shifted(9), Atom.atLeast(3, 1));
    NoOverlap2D maybe =
        NoOverlap2D.of(
            new Box(Task.fixed(A, 1), Task.fixed(B, 1)),
            new Box(optional, Task.fixed(View.constant(-5), 20)));
    assertMeans(maybe, x -> x[3] < 1 || x[0] < x[2]);
    assertThat(holds(NoOverlap2D.of())).isTrue();
  }

  private static boolean shareACell(
      int x1, int w1, int y1, int h1, int x2, int w2, int y2, int h2) {
    return IntStream.range(x1, x1 + w1).anyMatch(x -> x >= x2 && x < x2 + w2)
        && IntStream.range(y1, y1 + h1).anyMatch(y -> y >= y2 && y < y2 + h2);
  }

  @Test
  void packs_a_knapsack() {
    assertMeans(
        new Knapsack(Views.of(A, B), Longs.of(2, -1), C, Longs.of(1, 3), D),
        x -> x[0] + x[0] - x[1] <= x[2] && x[0] + x[1] + x[1] + x[1] >= x[3]);
    assertMeans(new Knapsack(NONE, Longs.of(), C, Longs.of(), D), x -> 0 <= x[2] && 0 >= x[3]);
  }

  @Test
  void lets_values_stand_only_after_others() {
    assertMeans(
        new Precedence(Views.of(A, B, C, D), Ints.of(2, 0, 3)),
        x -> {
          List<Integer> row = Arrays.stream(x).boxed().toList();
          return comesFirst(row, 2, 0) && comesFirst(row, 0, 3);
        });
    assertMeans(new Precedence(Views.of(A, A), Ints.of(1, 2)), x -> x[0] != 2);
    assertMeans(new Precedence(Views.of(A, B), Ints.of(1)), x -> true);
    assertThat(holds(new Precedence(NONE, Ints.of(1, 2)))).isTrue();
  }

  private static boolean comesFirst(List<Integer> row, int first, int then) {
    return !row.contains(then) || (row.contains(first) && row.indexOf(first) < row.indexOf(then));
  }
}
