package steelyard.results.brief.chart;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class LogScaleTest {

  @Test
  void spreadsDecadesEvenly_andLeavesTheRail() {
    LogScale scale = new LogScale(0.01, 100, 440, 40);

    assertThat(scale.at(0.01)).isZero();
    assertThat(scale.at(1)).isCloseTo(200, within(1e-9));
    assertThat(scale.at(100)).isCloseTo(400, within(1e-9));
    assertThat(scale.at(scale.railMiddle())).isCloseTo(420, within(1e-9));
    assertThat(scale.at(scale.end())).isCloseTo(440, within(1e-9));
    assertThat(scale.at(0)).isZero();
  }

  @Test
  void startsAtTheDecade_belowTheShortestTime() {
    assertThat(LogScale.covering(0.034, 0.001, 60, 332, 44).lowest())
        .isCloseTo(0.01, within(1e-12));
    assertThat(LogScale.covering(0.1, 0.001, 60, 332, 44).lowest()).isCloseTo(0.1, within(1e-12));
    assertThat(LogScale.covering(1e-7, 0.001, 60, 332, 44).lowest())
        .isCloseTo(0.001, within(1e-12));
  }

  @Test
  void hasRoom_whateverTheTimes() {
    assertThat(LogScale.covering(0, 0.001, 60, 332, 44).lowest()).isCloseTo(1, within(1e-12));
    assertThat(LogScale.covering(59, 0.001, 60, 332, 44).lowest()).isCloseTo(10, within(1e-12));
    assertThat(LogScale.covering(1, 0.001, 1, 332, 44).lowest()).isCloseTo(0.1, within(1e-12));
  }

  @Test
  void keepsTicks_clearOfTheLimit() {
    assertThat(new LogScale(0.01, 100, 440, 40).ticks()).hasSize(4).endsWith(10.0);
    assertThat(new LogScale(0.01, 12, 332, 44).ticks()).hasSize(3).endsWith(1.0);
  }

  @Test
  void refuses_whatIsNoScale() {
    assertThatThrownBy(() -> new LogScale(0, 60, 332, 44)).hasMessageContaining("0.0 to 60");
    assertThatThrownBy(() -> new LogScale(60, 60, 332, 44)).hasMessageContaining("60");
  }
}
