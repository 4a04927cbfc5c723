package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class GreedyPlanTest {
  private static Mould mould(int... stationsAndMinutes) {
    List<Operation> route =
        IntStream.range(0, stationsAndMinutes.length / 2)
            .mapToObj(i -> new Operation(stationsAndMinutes[2 * i], stationsAndMinutes[2 * i + 1]))
            .toList();
    return new Mould(route);
  }

  @Test
  void takes_most_work_left_first_where_two_can_start_together() {
    GreedyPlan plan = GreedyPlan.of(new Workshop(2, List.of(mould(0, 2, 1, 1), mould(0, 3, 1, 4))));
    assertThat(plan.start(1, 0)).isZero();
    assertThat(plan.start(0, 0)).isEqualTo(3);
    assertThat(plan.start(1, 1)).isEqualTo(3);
    assertThat(plan.start(0, 1)).isEqualTo(7);
    assertThat(plan.makespan()).isEqualTo(8);
  }

  @Test
  void lets_an_operation_of_no_minutes_pass() {
    GreedyPlan plan = GreedyPlan.of(new Workshop(1, List.of(mould(0, 5), mould(0, 0))));
    assertThat(plan.start(1, 0)).isZero();
    assertThat(plan.makespan()).isEqualTo(5);
  }
}
