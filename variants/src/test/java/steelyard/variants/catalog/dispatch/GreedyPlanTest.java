package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.model.Ints;

class GreedyPlanTest {
  private static Dispatch day(int truckCost, Order... orders) {
    Legs legs = new Legs(List.of(Ints.of(0, 2, 2), Ints.of(2, 0, 1), Ints.of(2, 1, 0)));
    return new Dispatch(List.of(new Truck(9, 1, 30, truckCost)), List.of(orders), legs, legs);
  }

  @Test
  void puts_an_order_where_it_makes_the_tour_dearer_by_least() {
    Order early = new Order(1, 1, 0, 3, 1, 0);
    Order late = new Order(1, 1, 8, 9, 1, 40);
    assertThat(GreedyPlan.of(day(5, late, early))).contains(new Plan(List.of(List.of(2, 1))));
  }

  @Test
  void leaves_an_order_to_the_carrier_that_is_cheaper() {
    Order cheap = new Order(1, 1, 0, 9, 1, 3);
    assertThat(GreedyPlan.of(day(0, cheap, cheap))).contains(new Plan(List.of(List.of())));
  }

  @Test
  void is_none_whenGiven_an_order_that_no_truck_can_take() {
    Order large = new Order(10, 1, 0, 9, 1, 0);
    assertThat(GreedyPlan.of(day(0, large, large))).isEmpty();
  }

  @Test
  void is_a_plan_that_the_checker_accepts_at_its_cost() {
    int plans = 0;
    for (Dispatch day : LongStream.range(0, 200).mapToObj(s -> RandomDay.of(s, 4, 3)).toList()) {
      Optional<Plan> plan = GreedyPlan.of(day);
      if (plan.isPresent()) {
        Answer answer = new Answer(plan.get().decisions(day), OptionalLong.empty());
        assertThat(DispatchChecker.check(day, answer))
            .as("%s", day)
            .isEqualTo(new Check(List.of(), OptionalLong.of(plan.get().cost(day))));
        plans++;
      }
    }
    assertThat(plans).isGreaterThan(50);
  }
}
