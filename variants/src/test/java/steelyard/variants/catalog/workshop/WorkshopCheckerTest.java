package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

class WorkshopCheckerTest {
  /** A plan of 55 minutes for ft06, the shortest there is; found by complete search. */
  private static final int[][] STARTS = {
    {5, 6, 16, 22, 42, 49},
    {0, 8, 13, 28, 38, 48},
    {0, 5, 9, 18, 27, 30},
    {8, 13, 22, 29, 37, 45},
    {13, 22, 25, 38, 48, 52},
    {13, 16, 19, 28, 45, 49}
  };

  private final Workshop workshop = Workshops.shipped("ft06");

  static SortedMap<String, Integer> plan() {
    SortedMap<String, Integer> starts = new TreeMap<>();
    for (int mould = 0; mould < STARTS.length; mould++) {
      for (int step = 0; step < STARTS[mould].length; step++) {
        starts.put("start[" + mould + "." + step + "]", STARTS[mould][step]);
      }
    }
    return starts;
  }

  private Check check(SortedMap<String, Integer> starts) {
    return WorkshopChecker.check(workshop, new Answer(starts, OptionalLong.empty()));
  }

  private Check checkWith(String start, int minute) {
    SortedMap<String, Integer> starts = plan();
    starts.put(start, minute);
    return check(starts);
  }

  @Test
  void finds_nothing_and_the_makespan_whenGiven_a_plan() {
    assertThat(check(plan())).isEqualTo(new Check(List.of(), OptionalLong.of(55)));
  }

  @Test
  void names_both_moulds_whenGiven_an_overlap() {
    assertThat(checkWith("start[3.0]", 7).problems())
        .containsExactly("station 1 has moulds 1 and 3 at once from minute 7 on");
  }

  @Test
  void names_the_step_whenGiven_a_start_before_the_mould_is_free() {
    assertThat(checkWith("start[0.1]", 5).problems())
        .containsExactly("mould 0 starts step 1 at minute 5, but is free only from minute 6 on");
  }

  @Test
  void refuses_a_start_before_the_plan_begins() {
    assertThat(checkWith("start[1.0]", -1).problems())
        .containsExactly("mould 1 starts step 0 at minute -1, but is free only from minute 0 on");
  }

  @Test
  void names_what_is_missing_whenGiven_half_a_plan() {
    SortedMap<String, Integer> starts = plan();
    starts.remove("start[2.4]");
    assertThat(check(starts))
        .isEqualTo(
            new Check(
                List.of("the plan does not say when mould 2 starts step 4"), OptionalLong.empty()));
  }

  @Test
  void counts_the_makespan_from_the_starts_whatever_the_answer_says() {
    SortedMap<String, Integer> starts = plan();
    starts.put("makespan", 12);
    starts.put("start[0.5]", 60);
    Check check = WorkshopChecker.check(workshop, new Answer(starts, OptionalLong.of(12)));
    assertThat(check.isRight()).isTrue();
    assertThat(check.objective()).hasValue(66);
  }
}
