package steelyard.results.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LuckTest {

  /**
   * Exact McNemar and sign test values: R 4.2.2 {@code binom.test(b, b + c)}. 10 of 12 and 11 of 14
   * are the comparison of two classifiers in Demšar (2006), JMLR 7:1-30, table 2, with the zeros
   * dropped and split.
   */
  @ParameterizedTest(name = "{0} : {1}")
  @CsvSource({
    " 9,  2, 0.0654296875",
    "12,  3, 0.03515625",
    " 5,  0, 0.0625",
    " 6,  0, 0.03125",
    "10,  4, 0.1795654297",
    "25, 12, 0.04703102744",
    "10,  2, 0.03857421875",
    "11,  3, 0.05737305",
    " 0,  0, 1",
    " 4,  4, 1",
  })
  void signTest_matchesR(int wins, int losses, double expected) {
    assertThat(SignTest.twoSided(wins, losses)).isCloseTo(expected, within(5e-9));
    assertThat(SignTest.twoSided(losses, wins)).isCloseTo(expected, within(5e-9));
  }

  /** Agresti's approval table, 150 against 86 changes; R 4.2.2 {@code binom.test(150, 236)}. */
  @Test
  void signTest_matchesR_onALargeTable() {
    assertThat(SignTest.twoSided(150, 86)).isCloseTo(3.71593614e-05, within(5e-14));
  }

  /** R 4.2.2 {@code p.adjust(c(.01, .04, .03, .005), "holm")}. */
  @Test
  void holm_matchesR() {
    double[] given = {.01, .04, .03, .005};

    assertThat(Holm.adjust(given))
        .containsExactly(new double[] {.03, .06, .06, .02}, within(1e-12));
    assertThat(given).containsExactly(.01, .04, .03, .005);
    assertThat(Holm.adjust(new double[0])).isEmpty();
  }

  /**
   * Benjamini &amp; Hochberg (1995), JRSS B 57:289-300, fifteen p-values (from memory); adjusted by
   * R 4.2.2 {@code p.adjust(p, "holm")}.
   */
  @Test
  void holm_matchesR_onFifteenValues() {
    double[] p = {
      .0001, .0004, .0019, .0095, .0201, .0278, .0298, .0344, .0459, .3240, .4262, .5719, .6528,
      .7590, 1
    };

    double[] adjusted = Holm.adjust(p);

    double[] expected = {.0015, .0056, .0247, .1140, .2211, .2780, .2780, .2780, .3213};
    for (int i = 0; i < expected.length; i++) {
      assertThat(adjusted[i]).as("p[%s]", i).isCloseTo(expected[i], within(1e-12));
    }
    assertThat(adjusted[9]).isEqualTo(1);
  }
}
