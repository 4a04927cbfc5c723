package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.ModelBuilder;
import steelyard.variants.model.judge.Evaluator;

/** Published answers. */
class PublishedTest {
  /** {@link JobShop#FT06}: optimum 55, Fisher &amp; Thompson (1963) by way of the OR-Library. */
  @Test
  void provesTheOptimum_ofTheSixBySixJobShop() {
    Model model = JobShop.model(JobShop.FT06);
    Solved solved = Solving.solve(model, new Goal.Optimise());
    assertThat(solved.outcome().status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome().bound()).hasValue(55);
    Evaluator.Judgement judged = new Evaluator(model).judge(solved.heard().last());
    assertThat(judged.violations()).isEmpty();
    assertThat(judged.objective()).hasValue(55);
  }

  /** OEIS A000170: ways of placing n queens that do not attack each other on an n X n board. */
  @ParameterizedTest
  @CsvSource({"1, 1", "2, 0", "3, 0", "4, 2", "5, 10", "6, 4", "7, 40"})
  void countsQueens(int n, int solutions) {
    List<IntVar> rows = new ArrayList<>();
    Model model =
        ModelBuilder.of(
            draft -> {
              IntStream.range(0, n)
                  .forEach(i -> rows.add(draft.integer("row[" + i + "]", 0, n - 1)));
              for (int slope = -1; slope <= 1; slope++) {
                int tilt = slope;
                List<View> scope =
                    IntStream.range(0, n).mapToObj(i -> rows.get(i).shifted(tilt * i)).toList();
                draft.group("apart").post(new AllDifferent(Views.of(scope)));
              }
            });
    Ints all = model.variables().decisions();
    Solved solved = Solving.solve(model, new Goal.Enumerate(all, Long.MAX_VALUE));
    assertThat(solved.heard().solutions).hasSize(solutions).doesNotHaveDuplicates();
    assertThat(solved.outcome().status())
        .isEqualTo(solutions == 0 ? Status.INFEASIBLE : Status.FEASIBLE);
  }

  /** OEIS A003022: length of the shortest ruler with n marks and no distance twice. */
  @ParameterizedTest
  @CsvSource({"2, 1", "3, 3", "4, 6", "5, 11", "6, 17"})
  void findsTheShortestRuler(int n, int length) {
    Model model =
        ModelBuilder.of(
            draft -> {
              List<IntVar> marks = new ArrayList<>();
              IntStream.range(0, n)
                  .forEach(i -> marks.add(draft.integer("mark[" + i + "]", 0, i == 0 ? 0 : n * n)));
              List<IntVar> distances = new ArrayList<>();
              for (int i = 0; i < n; i++) {
                for (int j = i + 1; j < n; j++) {
                  String name = "distance[" + i + "," + j + "]";
                  distances.add(draft.define(name, marks.get(j).minus(marks.get(i))));
                }
                if (i > 0) {
                  draft.group("order").post(marks.get(i - 1).lt(marks.get(i)));
                }
              }
              draft.group("distances").post(new AllDifferent(Views.of(distances)));
              draft.minimize(marks.get(n - 1));
            });
    assertThat(Solving.solve(model, new Goal.Optimise()).outcome().bound()).hasValue(length);
  }
}
