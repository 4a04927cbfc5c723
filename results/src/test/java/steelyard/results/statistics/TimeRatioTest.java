package steelyard.results.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import steelyard.results.statistics.TimeRatio.Kind;

class TimeRatioTest {

  private static final double FLOOR = 0.001;

  @Test
  void bounds_theRatioOfARunThatHitItsLimit() {
    SolveTime five = SolveTime.exactly(5);
    SolveTime ten = SolveTime.exactly(10);
    SolveTime open = SolveTime.beyond(60);

    assertThat(TimeRatio.of(five, ten, FLOOR)).contains(new TimeRatio(2, Kind.EXACT));
    assertThat(TimeRatio.of(five, open, FLOOR)).contains(new TimeRatio(12, Kind.AT_LEAST));
    assertThat(TimeRatio.of(open, ten, FLOOR)).contains(new TimeRatio(10.0 / 60, Kind.AT_MOST));
    assertThat(TimeRatio.of(open, open, FLOOR)).isEmpty();
  }

  @Test
  void timesBelowTheClock_countAsTheFloor() {
    assertThat(TimeRatio.of(SolveTime.exactly(0), SolveTime.exactly(0.002), FLOOR))
        .contains(new TimeRatio(2, Kind.EXACT));
  }

  @Test
  void mean_isGeometric_andKeepsABound() {
    TimeRatio half = new TimeRatio(0.5, Kind.EXACT);
    TimeRatio eight = new TimeRatio(8, Kind.EXACT);
    TimeRatio eightOrMore = new TimeRatio(8, Kind.AT_LEAST);

    Optional<TimeRatio> exact = TimeRatio.mean(List.of(half, eight));
    assertThat(exact.orElseThrow().value()).isCloseTo(2, within(1e-12));
    assertThat(exact.orElseThrow().kind()).isEqualTo(Kind.EXACT);
    assertThat(TimeRatio.mean(List.of(half, eightOrMore)).orElseThrow().kind())
        .isEqualTo(Kind.AT_LEAST);
    assertThat(TimeRatio.mean(List.of(eightOrMore, new TimeRatio(0.1, Kind.AT_MOST)))).isEmpty();
    assertThat(TimeRatio.mean(List.of())).isEmpty();
  }
}
