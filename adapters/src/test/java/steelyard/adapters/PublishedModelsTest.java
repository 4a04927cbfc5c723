package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;
import static steelyard.adapters.Backends.onEach;
import static steelyard.adapters.Backends.row;

import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.spi.Backend;
import steelyard.variants.model.Absolute;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.GlobalCardinality.Others;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Knapsack;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

/** Published problems with known sets of solutions, all found by every backend. */
class PublishedModelsTest {
  private static final long SECONDS = 60;

  private static List<IntVar> vector(Draft draft, String name, int size, int min, int max) {
    return IntStream.range(0, size).mapToObj(i -> draft.integer(name + i, min, max)).toList();
  }

  static Stream<Arguments> sequences() {
    return onEach(
        row(4, List.of(Ints.of(1, 2, 1, 0), Ints.of(2, 0, 2, 0))),
        row(5, List.of(Ints.of(2, 1, 2, 0, 0))),
        row(6, List.of()),
        row(7, List.of(Ints.of(3, 2, 1, 1, 0, 0, 0))),
        row(8, List.of(Ints.of(4, 2, 1, 0, 1, 0, 0, 0))));
  }

  /** CSPLib problem 19, magic sequences: x[i] is how often i stands in the sequence. */
  @ParameterizedTest
  @MethodSource("sequences")
  void finds_the_sequences_that_count_themselves(Backend backend, int n, List<Ints> sequences) {
    Model model =
        ModelBuilder.of(
            draft -> {
              Views row = Views.of(vector(draft, "x", n, 0, n - 1));
              Ints values = Ints.of(IntStream.range(0, n).toArray());
              draft.group("count").post(new GlobalCardinality(row, values, row, Others.FORBIDDEN));
            });
    assertThat(Backends.solutions(backend, model, SECONDS))
        .extracting(solution -> Ints.of(solution.complete().stream().limit(n).toArray()))
        .containsExactlyInAnyOrderElementsOf(sequences);
  }

  static Stream<Arguments> series() {
    return onEach(row(2, 2), row(3, 4), row(4, 4), row(5, 8), row(6, 24), row(7, 32), row(8, 40));
  }

  /**
   * CSPLib problem 7, all-interval series: permutations of 0..n-1 whose neighbours' distances are
   * all different; the counts by exhaustive search.
   */
  @ParameterizedTest
  @MethodSource("series")
  void counts_series_in_which_every_interval_stands(Backend backend, int n, int count) {
    Model model =
        ModelBuilder.of(
            draft -> {
              List<IntVar> notes = vector(draft, "note", n, 0, n - 1);
              List<IntVar> intervals = vector(draft, "interval", n - 1, 1, n - 1);
              draft.group("notes").post(new AllDifferent(Views.of(notes)));
              draft.group("intervals").post(new AllDifferent(Views.of(intervals)));
              for (int i = 1; i < n; i++) {
                IntVar step = draft.define("step" + i, notes.get(i).minus(notes.get(i - 1)));
                draft.group("steps").post(new Absolute(step.view(), intervals.get(i - 1).view()));
              }
            });
    assertThat(Backends.solutions(backend, model, SECONDS)).hasSize(count);
  }

  static Stream<Arguments> backends() {
    return onEach(row());
  }

  /**
   * CSPLib problem 1, the example of Dincbas, Simonis &amp; Van Hentenryck (1988), "Solving the
   * Car-Sequencing Problem in Constraint Logic Programming", ECAI, 290-295: six classes to build 1,
   * 1, 2, 2, 2 and 2 of, five options. Data from memory; the six sequences by exhaustive search.
   */
  @ParameterizedTest
  @MethodSource("backends")
  void finds_the_six_sequences_of_cars(Backend backend) {
    Model model =
        ModelBuilder.of(
            draft -> {
              Views line = Views.of(vector(draft, "car", 10, 0, 5));
              draft
                  .group("demand")
                  .post(
                      new GlobalCardinality(
                          line,
                          Ints.of(0, 1, 2, 3, 4, 5),
                          Views.ofConstants(1, 1, 2, 2, 2, 2),
                          Others.FORBIDDEN));
              window(draft, line, 1, 2, Ints.of(0, 4, 5));
              window(draft, line, 2, 3, Ints.of(2, 3, 5));
              window(draft, line, 1, 3, Ints.of(0, 4));
              window(draft, line, 2, 5, Ints.of(0, 1, 3));
              window(draft, line, 1, 5, Ints.of(2));
            });
    assertThat(Backends.solutions(backend, model, SECONDS))
        .extracting(solution -> Ints.of(solution.complete().stream().limit(10).toArray()))
        .containsExactlyInAnyOrder(
            Ints.of(0, 1, 5, 2, 4, 3, 3, 4, 2, 5),
            Ints.of(5, 2, 4, 3, 3, 4, 2, 5, 1, 0),
            Ints.of(0, 2, 5, 1, 4, 3, 2, 4, 3, 5),
            Ints.of(5, 3, 4, 2, 3, 4, 1, 5, 2, 0),
            Ints.of(0, 2, 5, 1, 5, 3, 4, 2, 3, 4),
            Ints.of(4, 3, 2, 4, 3, 5, 1, 5, 2, 0));
  }

  /** Of any {@code size} cars in a row at most {@code most} are of the classes. */
  private static void window(Draft draft, Views line, int most, int size, Ints classes) {
    for (int from = 0; from + size <= line.size(); from++) {
      Views window = Views.of(line.stream().skip(from).limit(size).toList());
      draft.group("options").post(new Count(window, classes, Comparison.LE, View.constant(most)));
    }
  }

  /**
   * Petersen (1967), "Computational Experience with Variants of the Balas Algorithm Applied to the
   * Selection of R&amp;D Projects", Management Science 13(9):736-750, problem 1, as in the file
   * mknap1 of the OR-Library: the optimum is 3800, and only items 2, 3 and 6 reach it.
   */
  @ParameterizedTest
  @MethodSource("backends")
  void packs_the_one_best_choice_of_projects(Backend backend) {
    long[][] weights = {
      {8, 12, 13, 64, 22, 41},
      {8, 12, 13, 75, 22, 41},
      {3, 6, 4, 18, 6, 4},
      {5, 10, 8, 32, 6, 12},
      {5, 13, 8, 42, 6, 20},
      {5, 13, 8, 48, 6, 20},
      {0, 0, 0, 0, 8, 0},
      {3, 0, 4, 0, 8, 0},
      {3, 2, 4, 0, 8, 4},
      {3, 2, 4, 8, 8, 4}
    };
    int[] capacities = {80, 96, 20, 36, 44, 48, 10, 18, 22, 24};
    Longs profits = Longs.of(100, 600, 1200, 2400, 500, 2000);
    Model model =
        ModelBuilder.of(
            draft -> {
              Views items = Views.of(vector(draft, "item", 6, 0, 1));
              IntVar profit = draft.integer("profit", 3800, 6800);
              for (int i = 0; i < weights.length; i++) {
                View capacity = View.constant(capacities[i]);
                draft
                    .group("budget")
                    .post(
                        new Knapsack(
                            items, Longs.of(weights[i]), capacity, profits, profit.view()));
              }
            });
    assertThat(Backends.solutions(backend, model, SECONDS))
        .extracting(solution -> Ints.of(solution.complete().stream().limit(7).toArray()))
        .containsExactly(Ints.of(0, 1, 1, 0, 0, 1, 3800));
  }
}
