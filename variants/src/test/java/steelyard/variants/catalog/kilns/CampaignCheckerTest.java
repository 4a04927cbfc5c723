package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Variant;

class CampaignCheckerTest {
  private static final Campaign CAMPAIGN = Campaigns.byHand();

  @Test
  void adds_up_fuel_changes_and_lateness() {
    Check check = CampaignChecker.check(CAMPAIGN, plan());
    assertThat(check.problems()).isEmpty();
    assertThat(check.objective()).hasValue(32);
  }

  /**
   * L1 alone in kiln B at once, L2 and L3 in kiln A three days later: one day and two days late.
   */
  @Test
  void the_cheapest_plan_is_the_one_that_can_be_found_by_hand() {
    assertThat(
            AllSolutions.minimum(AllSolutions.of(Variant.PLAIN.build(new KilnFamily(), CAMPAIGN))))
        .hasValue(4 + 5 + 1 * 2 + 2 * 1);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          in[L3,B.1]=0 | lot L3 is in 0 firings
          in[L3,B.2]=1 | lot L3 is in 2 firings
          in[L3,B.1]=0 | firing B.1 of day 5 holds nothing
          heat[A.1]=2 | lot L1 in firing A.1 does not mature
          heat[A.1]=3 | firing A.1 of day 0 has no heat that the lining bears
          end[A.1]=3 | firing A.1 of day 0 takes the wrong time
          out[L1]=3 | lot L1 in firing A.1 comes out on day 2, not 3
          start[A.2]=1 end[A.2]=4 out[L2]=4 | firing A.2 of day 1 is lit before the kiln was opened
          start[A.2]=2 end[A.2]=5 out[L2]=5 | lots L1 and L2 are fired out of order
          start[A.2]=7 end[A.2]=10 out[L2]=10 | firing A.2 of day 7 is not over when the campaign is
          start[B.1]=1 end[B.1]=3 out[L3]=3 | firing B.1 of day 1 is during repairs
          start[B.1]=3 end[B.1]=5 out[L3]=5 | on day 3 the crew cannot load 2 kilns
          start[B.1]=4 end[B.1]=6 out[L3]=6 | on day 4 the gas main does not give 5
          change[A.2]=7 | firing A.2 of day 3 changes the temperature for 8
          start[B.2]=8 | firing B.2 of day 8 is not lit but takes its time
          in[L2,A.2]=0 in[L2,A.1]=1 out[L2]=2 | lot L2 in firing A.1 is not dry yet
          in[L1,A.1]=0 in[L1,A.2]=1 out[L1]=6 | lot L1 in firing A.2 does not mature
          in[L3,B.1]=0 in[L3,B.2]=1 | firing B.2 of day 7 is not lit but holds lots
          heat[B.1]=0 | firing B.1 of day 5 is not lit but takes its time
          change[B.2]=1 | firing B.2 of day 7 is not lit but changes the temperature
          heat[B.1]=0 heat[B.2]=1 | firing B.2 of day 7 is lit after one that is not
          """)
  void says_what_is_wrong_whenGiven(String changes, String problem) {
    SortedMap<String, Integer> values = new TreeMap<>(plan().values());
    for (String change : List.of(changes.split(" ", -1))) {
      int at = change.lastIndexOf('=');
      values.put(change.substring(0, at), Integer.parseInt(change.substring(at + 1)));
    }
    assertThat(check(CAMPAIGN, values).problems()).contains(problem.strip().replace("\\\\", ""));
  }

  @Test
  void says_what_is_wrong_whenGiven_too_few_shelves_a_ship_missed_and_spoiled_glazes() {
    Kiln small = new Kiln("A", 1, 1, 2, 1, 2, 2, 0, CAMPAIGN.kilns().get(0).fuel(), List.of());
    Lot copper = new Lot("L3", 1, false, 1, 1, 1, 0, 3, 1, OptionalInt.of(6));
    Lot white = new Lot("L2", 2, false, 1, 2, 2, 1, 4, 2, OptionalInt.empty());
    Campaign campaign =
        CAMPAIGN
            .withKilns(List.of(small, CAMPAIGN.kilns().get(1)))
            .withLots(List.of(CAMPAIGN.lot(0), white, copper))
            .withTies(List.of(new Pair(0, 2)), List.of());
    SortedMap<String, Integer> values = new TreeMap<>(plan().values());
    assertThat(check(campaign, values).problems())
        .contains(
            "firing A.1 of day 0 has more lots than shelves",
            "firing A.1 of day 0 has more large lots than wide shelves",
            "kiln A has 1 hottest firings before relining",
            "lot L3 in firing B.1 misses its ship",
            "lots L1 and L3 are not fired together");
    values.put("in[L3,A.2]", 1);
    assertThat(check(campaign, values).problems())
        .contains("firing A.2 of day 3 holds glazes that spoil each other");
    values.put("in[L3,A.1]", 1);
    assertThat(check(campaign, values).problems())
        .contains("firing A.2 of day 3 holds a pale glaze right after a fuming one");
  }

  @Test
  void says_what_is_wrong_whenGiven_a_step_that_is_too_big() {
    Works works = new Works(100, 9, 1, 3, 0);
    assertThat(check(CAMPAIGN.with(works), plan().values()).problems())
        .containsExactly("firing A.2 of day 3 is too big a step in heat");
  }

  @Test
  void names_what_is_missing_whenGiven_part_of_an_answer() {
    SortedMap<String, Integer> values = new TreeMap<>(plan().values());
    values.remove("start[A.2]");
    Check check = check(CAMPAIGN, values);
    assertThat(check.problems()).containsExactly("the plan does not say what start[A.2] is");
    assertThat(check.objective()).isEmpty();
  }

  private static Answer plan() {
    return Campaigns.answer(CAMPAIGN, Campaigns.planByHand());
  }

  private static Check check(Campaign campaign, SortedMap<String, Integer> values) {
    return CampaignChecker.check(campaign, new Answer(values, OptionalLong.empty()));
  }
}
