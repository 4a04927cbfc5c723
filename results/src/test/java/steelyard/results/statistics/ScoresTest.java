package steelyard.results.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ScoresTest {

  private static List<List<SolveTime>> candidate(String name) {
    return ToyTable.instances(
        switch (name) {
          case "A" -> ToyTable.A;
          case "B" -> ToyTable.B;
          default -> ToyTable.C;
        });
  }

  @ParameterizedTest(name = "{0}, factor {1}")
  @CsvSource({
    "A,  1,  22.583333", "B,  1,  24.333333", "C,  1,  29.666667",
    "A,  2,  32.583333", "B,  2,  34.333333", "C,  2,  49.666667",
    "A, 10, 112.583333", "B, 10, 114.333333", "C, 10, 209.666667",
  })
  void penalises_runsThatHitTheLimit(String name, double factor, double expected) {
    assertThat(Scores.penalisedMean(candidate(name), factor)).isCloseTo(expected, within(5e-7));
  }

  /** Geometric means checked against the product of the times, to six decimals. */
  @ParameterizedTest(name = "{0}, shift {1}")
  @CsvSource({
    "A,  0,  7.023122", "B,  0, 12.295956", "C,  0, 19.518613",
    "A,  1,  8.966326", "B,  1, 13.441430", "C,  1, 20.099903",
    "A, 10, 14.257540", "B, 10, 17.615455", "C, 10, 22.968941",
  })
  void shifts_beforeTakingTheGeometricMean(String name, double shift, double expected) {
    assertThat(Scores.shiftedGeometricMean(candidate(name), shift))
        .isCloseTo(expected, within(5e-7));
  }

  @ParameterizedTest
  @CsvSource({"A, 5", "B, 5", "C, 4"})
  void counts_solvedInstances(String name, double expected) {
    List<List<Boolean>> solved =
        candidate(name).stream()
            .map(runs -> runs.stream().map(time -> !time.censored()).toList())
            .toList();

    assertThat(Scores.count(solved)).isEqualTo(expected);
  }

  @Test
  void averagesSeeds_withinTheInstanceFirst() {
    // One instance with seeds 1 s and 3 s, another with a single run of 8 s: (2 + 8) / 2.
    List<List<SolveTime>> uneven =
        List.of(List.of(SolveTime.exactly(1), SolveTime.exactly(3)), List.of(SolveTime.exactly(8)));

    assertThat(Scores.penalisedMean(uneven, 2)).isEqualTo(5);
    // exp((ln 1 + ln 3) / 2) = √3; √(√3 · 8).
    assertThat(Scores.shiftedGeometricMean(uneven, 0))
        .isCloseTo(Math.sqrt(Math.sqrt(3) * 8), within(1e-12));
    assertThat(Scores.count(List.of(List.of(true, false), List.of(true)))).isEqualTo(1.5);
  }

  @Test
  void refuses_whatHasNoMean() {
    assertThatThrownBy(() -> Scores.penalisedMean(List.of(), 2)).hasMessageContaining("instance");
    assertThatThrownBy(() -> Scores.penalisedMean(List.of(List.of()), 2))
        .hasMessageContaining("run");
    assertThatThrownBy(() -> Scores.penalisedMean(candidate("A"), 0.5)).hasMessageContaining("0.5");
    assertThatThrownBy(() -> Scores.shiftedGeometricMean(candidate("A"), -1))
        .hasMessageContaining("-1");
    assertThatThrownBy(() -> SolveTime.exactly(Double.NaN)).hasMessageContaining("NaN");
  }
}
