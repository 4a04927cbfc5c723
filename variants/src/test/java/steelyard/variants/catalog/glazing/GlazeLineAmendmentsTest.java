package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.Roles;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Model;

/** Each amendment is what its role says, on every order of the tiles of small lines. */
class GlazeLineAmendmentsTest {
  private static final GlazeLineFamily FAMILY = new GlazeLineFamily();
  private static final Roles<GlazeLine> ROLES =
      Roles.of(FAMILY, LongStream.range(0, 120).mapToObj(RandomLine::of));

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
  @ValueSource(strings = {"among-windows", "window-automata", "running-counts"})
  void keep_a_best_order_together_whenGiven(String windows) {
    ROLES.assertKeepsABest(
        Set.of(
            windows,
            "cardinality",
            "run-automaton",
            "treatment-totals",
            "surrogate-demand",
            "kind-table",
            "kind-lookup",
            "neighbours",
            "glaze-runs",
            "least-overruns",
            "greedy-cost",
            "mirror-order",
            "middle-out",
            "greedy-hint"));
  }

  @Test
  void hints_the_greedy_order() {
    GlazeLine line = RandomLine.of(5);
    Model model = Variant.of(FAMILY, Set.of("greedy-hint")).build(FAMILY, line);
    assertThat(model.hint().variables()).isEqualTo(model.variables().decisions());
    assertThat(model.hint().values().stream().boxed()).isEqualTo(GreedyLine.of(line));
  }

  @Test
  void goes_from_the_middle_to_both_ends() {
    assertThat(SearchOrders.fromTheMiddle(5)).containsExactly(2, 3, 1, 4, 0);
    assertThat(SearchOrders.fromTheMiddle(4)).containsExactly(1, 2, 0, 3);
    assertThat(SearchOrders.fromTheMiddle(1)).containsExactly(0);
  }

  @Test
  void decides_the_scarcest_treatment_first() {
    GlazeLine line = Lines.shipped("4_72");
    List<Integer> order = SearchOrders.scarcestFirst(line);
    double[] load =
        IntStream.range(0, 5)
            .mapToDouble(
                t ->
                    (double) line.tilesWith(t)
                        * line.treatment(t).window()
                        / line.treatment(t).most())
            .toArray();
    assertThat(order).containsExactlyInAnyOrder(0, 1, 2, 3, 4);
    assertThat(order.stream().map(t -> -load[t])).isSorted();
  }
}
