package steelyard.results.ledger;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;

class ClaimsTest {

  private static final Standing NONE = new Standing(Claim.NONE, 0);
  private static final Standing ALONE = new Standing(Claim.ALONE, 0);
  private static final Standing CONTRADICTED = new Standing(Claim.CONTRADICTED, 0);

  @Test
  void a_claim_is_alone_given_nobody_else_claims() {
    assertThat(standings(optimal("sat", 40), feasible("cpsat", 42), unknown("engine")))
        .containsExactly(ALONE, NONE, NONE);
  }

  @Test
  void a_claim_is_agreed_by_the_number_of_other_technologies_that_claim_the_same() {
    assertThat(standings(optimal("sat", 40), optimal("cpsat", 40), optimal("engine", 40)))
        .containsOnly(new Standing(Claim.AGREED, 2));
    assertThat(standings(infeasible("sat"), infeasible("cpsat"), unknown("engine")))
        .containsExactly(agreed(1), agreed(1), NONE);
  }

  @Test
  void a_technology_does_not_confirm_itself() {
    assertThat(standings(optimal("sat", 40), optimal("sat", 40))).containsOnly(ALONE);
    assertThat(standings(optimal("sat", 40), optimal("sat", 40), optimal("cpsat", 40)))
        .containsOnly(agreed(1));
  }

  @Test
  void two_optima_contradict_each_other_given_no_witness() {
    assertThat(standings(optimal("sat", 40), optimal("cpsat", 42), feasible("engine", 45)))
        .containsExactly(CONTRADICTED, CONTRADICTED, NONE);
  }

  @Test
  void two_optima_contradict_each_other_even_on_one_technology() {
    assertThat(standings(optimal("sat", 40), optimal("sat", 42))).containsOnly(CONTRADICTED);
  }

  @Test
  void a_better_valid_solution_refutes_an_optimum_and_leaves_the_better_one_standing() {
    assertThat(
            standings(
                valid(optimal("sat", 40)), valid(optimal("cpsat", 42)), optimal("engine", 40)))
        .containsExactly(agreed(1), CONTRADICTED, agreed(1));
    assertThat(standings(valid(feasible("sat", 39)), optimal("cpsat", 40)))
        .containsExactly(NONE, CONTRADICTED);
  }

  @Test
  void an_unjudged_or_refused_solution_refutes_nothing() {
    assertThat(standings(feasible("sat", 39), optimal("cpsat", 40))).containsExactly(NONE, ALONE);
    assertThat(standings(invalid(feasible("sat", 39)), optimal("cpsat", 40)))
        .containsExactly(NONE, ALONE);
  }

  @Test
  void better_is_greater_given_a_maximised_objective() {
    assertThat(standings(maximised(valid(feasible("sat", 41))), maximised(optimal("cpsat", 40))))
        .containsExactly(NONE, CONTRADICTED);
    assertThat(standings(maximised(valid(feasible("sat", 39))), maximised(optimal("cpsat", 40))))
        .containsExactly(NONE, ALONE);
  }

  @Test
  void a_valid_solution_refutes_infeasibility() {
    assertThat(standings(infeasible("sat"), infeasible("cpsat"), valid(feasible("engine", 40))))
        .containsExactly(CONTRADICTED, CONTRADICTED, NONE);
    assertThat(standings(infeasible("sat"), feasible("engine", 40))).containsExactly(ALONE, NONE);
  }

  @Test
  void a_valid_solution_without_an_objective_refutes_infeasibility() {
    Claims.Answer solved =
        new Claims.Answer(
            "engine",
            Status.FEASIBLE,
            true,
            OptionalLong.empty(),
            OptionalLong.empty(),
            Check.VALID);

    assertThat(standings(solved, infeasible("sat"))).containsExactly(NONE, CONTRADICTED);
  }

  @Test
  void infeasibility_and_an_optimum_contradict_each_other_given_no_witness() {
    assertThat(standings(infeasible("sat"), optimal("cpsat", 40))).containsOnly(CONTRADICTED);
    assertThat(standings(infeasible("sat"), valid(optimal("cpsat", 40))))
        .containsExactly(CONTRADICTED, ALONE);
  }

  @Test
  void a_refused_optimum_neither_supports_nor_contradicts_others_but_is_weighed_itself() {
    assertThat(standings(invalid(optimal("sat", 38)), optimal("cpsat", 40)))
        .containsExactly(CONTRADICTED, ALONE);
    assertThat(standings(invalid(optimal("sat", 40)), optimal("cpsat", 40)))
        .containsExactly(agreed(1), ALONE);
  }

  @Test
  void a_valid_solution_beyond_a_bound_contradicts_whoever_claims_the_bound() {
    assertThat(standings(bounded(unknown("sat"), 41), valid(feasible("cpsat", 40))))
        .containsExactly(CONTRADICTED, NONE);
    assertThat(standings(bounded(unknown("sat"), 40), valid(feasible("cpsat", 40))))
        .containsExactly(NONE, NONE);
  }

  @Test
  void differences_beyond_the_range_of_long_do_not_wrap() {
    assertThat(standings(valid(feasible("sat", Long.MIN_VALUE)), optimal("cpsat", Long.MAX_VALUE)))
        .containsExactly(NONE, CONTRADICTED);
  }

  private static Standing agreed(int by) {
    return new Standing(Claim.AGREED, by);
  }

  private static List<Standing> standings(Claims.Answer... answers) {
    Claims claims = new Claims(List.of(answers));
    return List.of(answers).stream().map(claims::of).toList();
  }

  private static Claims.Answer optimal(String technology, long objective) {
    return answer(technology, Status.OPTIMAL, OptionalLong.of(objective));
  }

  private static Claims.Answer feasible(String technology, long objective) {
    return answer(technology, Status.FEASIBLE, OptionalLong.of(objective));
  }

  private static Claims.Answer infeasible(String technology) {
    return answer(technology, Status.INFEASIBLE, OptionalLong.empty());
  }

  private static Claims.Answer unknown(String technology) {
    return answer(technology, Status.UNKNOWN, OptionalLong.empty());
  }

  private static Claims.Answer answer(String technology, Status status, OptionalLong objective) {
    return new Claims.Answer(
        technology, status, true, objective, OptionalLong.empty(), Check.UNCHECKED);
  }

  private static Claims.Answer valid(Claims.Answer a) {
    return new Claims.Answer(
        a.technology(), a.status(), a.minimize(), a.objective(), a.bound(), Check.VALID);
  }

  private static Claims.Answer invalid(Claims.Answer a) {
    return new Claims.Answer(
        a.technology(), a.status(), a.minimize(), a.objective(), a.bound(), Check.INVALID);
  }

  private static Claims.Answer maximised(Claims.Answer a) {
    return new Claims.Answer(
        a.technology(), a.status(), false, a.objective(), a.bound(), a.check());
  }

  private static Claims.Answer bounded(Claims.Answer a, long bound) {
    return new Claims.Answer(
        a.technology(), a.status(), a.minimize(), a.objective(), OptionalLong.of(bound), a.check());
  }
}
