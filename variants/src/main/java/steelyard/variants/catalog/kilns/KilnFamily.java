package steelyard.variants.catalog.kilns;

import java.io.IOException;
import java.util.List;
import java.util.SortedMap;
import java.util.stream.Stream;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;
import steelyard.variants.family.Featured;
import steelyard.variants.family.Generating;
import steelyard.variants.family.Hinting;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;
import steelyard.variants.family.Recalling;
import steelyard.variants.family.Shrinking;
import steelyard.variants.model.build.Draft;

/** Firing campaigns of the tileworks' kilns: batching, sequencing and lateness in one. */
public final class KilnFamily
    implements Featured<Campaign>,
        Generating<Campaign>,
        Shrinking<Campaign>,
        Hinting<Campaign>,
        Recalling<Campaign> {
  @Override
  public String name() {
    return "kiln-campaigns";
  }

  @Override
  public String summary() {
    return "which lots of tiles go into which firing of which kiln, how hot and when, at least cost";
  }

  @Override
  public Campaign read(InstanceSource source) throws IOException {
    return CampaignReader.read(source);
  }

  @Override
  public void plain(Campaign campaign, Draft draft) {
    PlainCampaign.write(campaign, draft);
  }

  @Override
  public List<Amendment<Campaign>> amendments() {
    return KilnAmendments.all();
  }

  @Override
  public Check check(Campaign campaign, Answer answer) {
    return CampaignChecker.check(campaign, answer);
  }

  @Override
  public String show(Campaign campaign, Answer answer) {
    return PlanSheet.of(campaign, answer);
  }

  @Override
  public SortedMap<String, Double> features(Campaign campaign) {
    return Features.of(campaign);
  }

  @Override
  public String generate(long seed) {
    Campaign campaign = CampaignGenerator.of(Recipe.smallest(seed), seed);
    return CampaignText.of(campaign, "made up from seed " + seed);
  }

  @Override
  public Stream<String> shrink(Campaign campaign) {
    return Shrinker.of(campaign).map(smaller -> CampaignText.of(smaller, "made smaller"));
  }

  @Override
  public SortedMap<String, Integer> hint(Campaign before, Answer plan, Campaign now) {
    return YesterdaysPlan.hint(before, plan, now);
  }

  @Override
  public KnownSolution recall(Campaign campaign, InstanceSource file) throws IOException {
    return BookedPlan.read(campaign, file);
  }
}
