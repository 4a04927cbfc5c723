package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Check;
import steelyard.variants.model.Ints;

class GreedyPlanTest {
  @Test
  void makes_plans_that_are_right() {
    List<Campaign> campaigns = LongStream.range(0, 400).mapToObj(RandomCampaign::of).toList();
    int planned = 0;
    for (Campaign campaign : campaigns) {
      Optional<Plan> plan = GreedyPlan.of(campaign);
      if (plan.isPresent()) {
        planned++;
        Check check = CampaignChecker.check(campaign, Campaigns.answer(campaign, plan.get()));
        assertThat(check.problems()).as("%s", campaign).isEmpty();
      }
    }
    assertThat(planned).isBetween(100, 399);
  }

  /**
   * L1 is due first and costs least in kiln B. L3 would spoil it and goes into A, on the next day
   * as the crew lights one kiln a day. L2 is decorated too late for that; B is the cheaper to light
   * again, when it is repaired.
   */
  @Test
  void puts_each_lot_where_it_adds_least() {
    Campaign campaign = Campaigns.byHand();
    Plan plan = GreedyPlan.of(campaign).orElseThrow();
    assertThat(plan.firingOf()).isEqualTo(Ints.of(2, 3, 0));
    assertThat(plan.heats()).isEqualTo(Ints.of(1, 0, 1, 1));
    assertThat(plan.starts()).isEqualTo(Ints.of(1, 0, 0, 3));
  }

  @Test
  void says_so_whenGiven_a_dead_end() {
    Campaign campaign = Campaigns.byHand();
    Campaign hurried = campaign.with(campaign.works().withDays(4));
    assertThat(GreedyPlan.of(hurried)).isEmpty();
  }
}
