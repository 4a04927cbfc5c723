package steelyard.adapters.engine.search;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;

class RestartsTest {
  /**
   * The first 31 terms and the sums of the first 2^k - 1 terms, k·2^(k-1), of the universal
   * sequence of Luby, Sinclair and Zuckerman (1993), Information Processing Letters 47:173-180.
   */
  @Test
  void followsTheUniversalSequence() {
    long[] published = {
      1, 1, 2, 1, 1, 2, 4, 1, 1, 2, 1, 1, 2, 4, 8, 1, 1, 2, 1, 1, 2, 4, 1, 1, 2, 1, 1, 2, 4, 8, 16
    };
    Restarts luby = Restarts.luby(1);
    long[] terms = LongStream.generate(luby::nextCutoff).limit(63).toArray();
    assertThat(terms).startsWith(published);
    long[] sums = {1, 4, 12, 32, 80, 192};
    for (int k = 1; k <= 6; k++) {
      assertThat(LongStream.of(terms).limit((1L << k) - 1).sum()).isEqualTo(sums[k - 1]);
    }
  }

  @Test
  void scalesTheUniversalSequence() {
    Restarts luby = Restarts.luby(100);
    assertThat(LongStream.generate(luby::nextCutoff).limit(4))
        .containsExactly(100L, 100L, 200L, 100L);
  }

  @Test
  void growsGeometrically_withoutOverflow() {
    Restarts geometric = Restarts.geometric(10, 1.5);
    assertThat(LongStream.generate(geometric::nextCutoff).limit(4))
        .containsExactly(10L, 15L, 22L, 33L);
    Restarts steep = Restarts.geometric(1, 1e9);
    assertThat(LongStream.generate(steep::nextCutoff).limit(9)).isSorted().allMatch(c -> c > 0);
  }

  @Test
  void refusesPoliciesThatDoNotGrow() {
    assertThatThrownBy(() -> Restarts.luby(0)).hasMessageContaining("0");
    assertThatThrownBy(() -> Restarts.geometric(5, 1)).hasMessageContaining("factor");
  }
}
