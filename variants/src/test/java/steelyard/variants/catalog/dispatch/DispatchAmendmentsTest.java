package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Set;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.Roles;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Model;

/** Each amendment is what its role says, on every plan of small days. */
class DispatchAmendmentsTest {
  private static final DispatchFamily FAMILY = new DispatchFamily();

  /** Up to two orders for two trucks, and up to three orders for one. */
  private static final Roles<Dispatch> ROLES =
      Roles.of(
          FAMILY,
          LongStream.range(0, 160)
              .mapToObj(
                  seed -> seed % 2 == 0 ? RandomDay.of(seed, 2, 2) : RandomDay.of(seed, 3, 1)));

  static Stream<String> all() {
    return Roles.amendments(FAMILY, "implied", "search", "reformulation", "dominance", "symmetry");
  }

  static Stream<String> cutting() {
    return Roles.amendments(FAMILY, "dominance", "symmetry");
  }

  @Test
  void the_samples_are_of_both_sorts() {
    ROLES.assertSomeCanBeSolvedAndSomeCannot();
  }

  @ParameterizedTest
  @MethodSource("all")
  void is_what_its_role_says_whenGiven(String amendment) {
    ROLES.assertTrue(amendment);
  }

  @ParameterizedTest
  @MethodSource("all")
  void changes_something_whenGiven(String amendment) {
    ROLES.assertChangesSomething(amendment);
  }

  @ParameterizedTest
  @MethodSource("cutting")
  void leaves_out_something_whenGiven(String amendment) {
    ROLES.assertLeavesOutSomething(amendment);
  }

  @ParameterizedTest
  @ValueSource(strings = {"element-times", "leg-table"})
  void keep_a_best_plan_together_whenGiven(String times) {
    ROLES.assertKeepsABest(
        Set.of(
            times,
            "tours-by-time",
            "packed-loads",
            "different-next",
            "two-ways",
            "impossible-ways",
            "reachable-times",
            "never-together",
            "shift-budget",
            "enough-trucks",
            "cheapest-ways-in",
            "no-waiting",
            "twin-orders",
            "worth-the-way",
            "greedy-cost",
            "twin-trucks",
            "orders-first",
            "greedy-hint"));
  }

  @Test
  void hints_the_whole_greedy_plan() {
    Dispatch day = Days.shipped("tiny-3-2");
    Model model = Variant.of(FAMILY, Set.of("greedy-hint")).build(FAMILY, day);
    assertThat(model.hint().size()).isEqualTo(model.variables().decisions().size());
    assertThat(GreedyPlan.of(day)).isPresent();
  }
}
