package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.model.Ints;

class DispatchCheckerTest {
  /** Three stops at 1, 2 and 3 quarters along one road, ten in cost for each, and two trucks. */
  private static final Dispatch DAY =
      new Dispatch(
          List.of(new Truck(6, 1, 20, 5), new Truck(9, 2, 12, 7)),
          List.of(
              new Order(4, 2, 0, 9, 1, 50),
              new Order(3, 1, 6, 9, 2, 60),
              new Order(2, 2, 0, 8, 1, 0)),
          road(1),
          road(10));

  private final SortedMap<String, Integer> plan =
      new Plan(List.of(List.of(3, 2), List.of(1))).decisions(DAY);

  private static Legs road(int step) {
    return new Legs(
        List.of(
            Ints.of(0, step, 2 * step, 3 * step),
            Ints.of(step, 0, step, 2 * step),
            Ints.of(2 * step, step, 0, step),
            Ints.of(3 * step, 2 * step, step, 0)));
  }

  private Check check() {
    return DispatchChecker.check(DAY, new Answer(plan, OptionalLong.of(1)));
  }

  private void assertProblems(String... problems) {
    assertThat(check().problems()).containsExactly(problems);
  }

  @Test
  void finds_nothing_and_the_cost_whenGiven_a_plan() {
    assertThat(check()).isEqualTo(new Check(List.of(), OptionalLong.of(5 + 60 + 7 + 20)));
  }

  @Test
  void adds_the_carrier_whenGiven_a_stop_without_a_truck() {
    plan.put("next[1.0]", 0);
    plan.put("next[1.1]", 1);
    plan.put("begin[1]", 0);
    assertThat(check()).isEqualTo(new Check(List.of(), OptionalLong.of(5 + 60 + 50)));
  }

  @Test
  void names_the_times_whenGiven_a_truck_that_is_late() {
    plan.put("begin[3]", 2);
    assertProblems("truck 0 comes to stop 3 at 3, after unloading is to begin at 2");
    plan.put("begin[3]", 5);
    plan.put("begin[2]", 6);
    assertProblems("truck 0 comes to stop 2 at 7, after unloading is to begin at 6");
  }

  @Test
  void names_the_yard_whenGiven_a_time_when_it_is_closed() {
    plan.put("begin[2]", 10);
    assertProblems("unloading at stop 2 is to begin at 10; it can from 6 to 9");
  }

  @Test
  void names_the_load_and_the_shift_whenGiven_too_much_for_one_truck() {
    plan.put("next[0.2]", 1);
    plan.put("next[0.1]", 0);
    plan.put("begin[1]", 9);
    plan.put("next[1.0]", 0);
    plan.put("next[1.1]", 1);
    assertProblems("truck 0 has 9 pallets; it takes 6");
    Dispatch hurried =
        new Dispatch(
            List.of(new Truck(9, 1, 10, 5), DAY.truck(1)), DAY.orders(), DAY.times(), DAY.costs());
    assertThat(DispatchChecker.check(hurried, new Answer(plan, OptionalLong.empty())).problems())
        .containsExactly("truck 0 is back at 11, after its shift, which ends at 10");
  }

  @Test
  void names_the_gate_whenGiven_too_large_a_truck() {
    assertThat(DispatchChecker.check(DAY, new Answer(swapped(), OptionalLong.empty())).problems())
        .contains("truck 1 does not get through the gate of stop 2");
  }

  private SortedMap<String, Integer> swapped() {
    for (int stop = 0; stop <= 3; stop++) {
      int one = plan.get("next[0." + stop + "]");
      plan.put("next[0." + stop + "]", plan.get("next[1." + stop + "]"));
      plan.put("next[1." + stop + "]", one);
    }
    return plan;
  }

  @Test
  void names_the_stop_whenGiven_two_trucks_or_none() {
    plan.put("next[1.1]", 3);
    plan.put("next[1.3]", 0);
    plan.put("begin[3]", 4);
    assertThat(check().problems()).contains("2 trucks come to stop 3");
    plan.put("next[1.1]", 0);
    plan.put("next[1.3]", 3);
    plan.put("next[0.0]", 2);
    plan.put("next[0.3]", 3);
    assertProblems("no truck comes to stop 3, and no carrier takes the order");
  }

  @Test
  void wants_the_opening_as_time_whenGiven_a_stop_without_a_truck() {
    plan.put("next[1.0]", 0);
    plan.put("next[1.1]", 1);
    plan.put("begin[1]", 3);
    assertProblems("no truck comes to stop 1: its time should be when it opens, 0, not 3");
  }

  @Test
  void names_the_stop_whenGiven_a_round_without_the_works() {
    plan.put("next[0.2]", 3);
    assertThat(check().problems()).contains("truck 0 comes to stop 3 again and never back");
    plan.put("next[0.2]", 0);
    plan.put("next[1.2]", 3);
    plan.put("next[1.3]", 2);
    assertProblems(
        "truck 1 goes on from stop 2, where its tour does not come",
        "truck 1 goes on from stop 3, where its tour does not come");
  }

  @Test
  void names_what_is_missing_or_no_stop() {
    plan.remove("begin[2]");
    plan.put("next[1.3]", 4);
    assertThat(check())
        .isEqualTo(
            new Check(
                List.of("next[1.3] is 4, not from 0 to 3", "the plan does not say begin[2]"),
                OptionalLong.empty()));
  }
}
