package steelyard.adapters.sat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.ModelBuilder;

/** Published counts and optima. */
class PublishedPuzzlesTest {
  /** OEIS A000170: ways to place n queens that do not attack each other. */
  @ParameterizedTest
  @CsvSource({"1, 1", "2, 0", "3, 0", "4, 2", "5, 10", "6, 4", "7, 40", "8, 92"})
  void countsQueens_asInA000170(int n, int count) {
    Model model =
        ModelBuilder.of(
            draft -> {
              List<IntVar> queens =
                  IntStream.range(0, n)
                      .mapToObj(i -> draft.integer("q" + i, Domain.between(0, n - 1)))
                      .toList();
              for (int slope : new int[] {-1, 0, 1}) {
                Views line =
                    Views.of(
                        IntStream.range(0, n)
                            .mapToObj(i -> queens.get(i).shifted(slope * i))
                            .toList());
                draft.group("line").post(Formula.holds(new AllDifferent(line)));
              }
            });
    Solved solved = Solved.of(model, Solved.all(model));
    assertThat(solved.solutions).hasSize(count).doesNotHaveDuplicates();
    assertThat(solved.outcome.ended()).isEqualTo(SolveOutcome.Why.EXHAUSTED);
  }

  /** OEIS A003022: length of the shortest ruler with n marks. */
  @ParameterizedTest
  @CsvSource({"2, 1", "3, 3", "4, 6", "5, 11", "6, 17", "7, 25"})
  void findsShortestRulers_asInA003022(int n, long length) {
    Solved solved = Solved.of(Rulers.of(n), new Goal.Optimise());
    assertThat(solved.outcome.status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome.bound()).hasValue(length);
    assertThat(solved.solutions.get(solved.solutions.size() - 1).get(n - 1))
        .isEqualTo((int) length);
  }
}
