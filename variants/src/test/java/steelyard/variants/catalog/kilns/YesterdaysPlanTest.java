package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.model.Ints;

class YesterdaysPlanTest {
  private static final Campaign BEFORE = Campaigns.byHand();
  private static final Answer PLAN = Campaigns.answer(BEFORE, Campaigns.planByHand());

  /** The campaign as it stands on a later day, with the lots that are left. */
  private static Campaign on(int day, List<Lot> lots) {
    Works works = BEFORE.works();
    return BEFORE
        .with(new Works(day, works.days(), works.crew(), works.gas(), works.step()))
        .withTies(List.of(), List.of())
        .withLots(lots);
  }

  @Test
  void is_all_of_the_plan_on_the_same_day() {
    assertThat(YesterdaysPlan.hint(BEFORE, PLAN, BEFORE))
        .containsOnlyKeys(
            "heat[A.1]",
            "start[A.1]",
            "in[L1,A.1]",
            "heat[A.2]",
            "start[A.2]",
            "in[L2,A.2]",
            "heat[B.1]",
            "start[B.1]",
            "in[L3,B.1]")
        .allSatisfy((name, value) -> assertThat(value).isEqualTo(PLAN.value(name)));
  }

  @Test
  void leaves_out_what_is_lit_already_and_moves_the_rest_up() {
    Campaign now = on(102, BEFORE.lots().subList(1, 3));
    assertThat(YesterdaysPlan.hint(BEFORE, PLAN, now))
        .containsOnlyKeys(
            "heat[A.1]", "start[A.1]", "in[L2,A.1]", "heat[B.1]", "start[B.1]", "in[L3,B.1]")
        .containsEntry("heat[A.1]", 2)
        .containsEntry("start[A.1]", 1)
        .containsEntry("start[B.1]", 3);
  }

  @Test
  void says_nothing_of_new_lots_and_of_kilns_that_are_gone_or_do_not_bear_the_heat() {
    Campaign now = on(103, List.of(BEFORE.lot(2).named("NEW")));
    Kiln cooler = new Kiln("A", 4, 2, 1, 1, 2, 2, 1, Ints.of(5), List.of());
    assertThat(YesterdaysPlan.hint(BEFORE, PLAN, now.withKilns(List.of(cooler)))).isEmpty();
  }
}
