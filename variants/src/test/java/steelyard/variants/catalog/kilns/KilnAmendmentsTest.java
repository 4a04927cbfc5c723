package steelyard.variants.catalog.kilns;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Deque;
import java.util.HashSet;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Amendment;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Model;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** Each amendment is what its role says, on every plan of small campaigns. */
class KilnAmendmentsTest {
  private static final KilnFamily FAMILY = new KilnFamily();
  private static final List<Sample> SAMPLES =
      LongStream.range(0, 150)
          .mapToObj(RandomCampaign::of)
          .map(Sample::of)
          .filter(sample -> !sample.plans.isEmpty())
          .toList();

  /** Those of which a variant with more decisions can be solved in every way too. */
  private static final List<Sample> FEW_PLANS =
      SAMPLES.stream().filter(sample -> sample.plans.size() <= 12).toList();

  /** A campaign with all its plans. */
  private record Sample(Campaign campaign, Model plain, List<Judgement> plans) {
    static Sample of(Campaign campaign) {
      Model plain = Variant.PLAIN.build(FAMILY, campaign);
      return new Sample(campaign, plain, AllSolutions.of(plain));
    }

    Model with(Collection<String> amendments) {
      return Variant.of(FAMILY, amendments).build(FAMILY, campaign);
    }

    /** The plans as the variant's model judges them. */
    List<Judgement> judgedBy(Model variant) {
      Evaluator evaluator = new Evaluator(variant);
      return plans.stream()
          .map(plan -> evaluator.judge(AllSolutions.decisions(plain, plan)))
          .toList();
    }

    List<Judgement> keptBy(Model variant) {
      return judgedBy(variant).stream().filter(Judgement::isValid).toList();
    }

    /** The values of plain's variables, by name. */
    SortedMap<String, Integer> shared(Model variant, Judgement solution) {
      SortedMap<String, Integer> values = new TreeMap<>();
      for (int v = 0; v < variant.variables().size(); v++) {
        String name = variant.variables().name(v);
        if (plain.variables().handle(name).isPresent()) {
          values.put(name, solution.complete().get(v));
        }
      }
      return values;
    }

    /** The values of plain's decisions, by name. */
    SortedMap<String, Integer> decisions(Judgement plan) {
      SortedMap<String, Integer> values = new TreeMap<>();
      plain.variables().decisions().stream()
          .forEach(v -> values.put(plain.variables().name(v), plan.complete().get(v)));
      return values;
    }

    @Override
    public String toString() {
      return CampaignText.of(campaign, "a sample");
    }
  }

  private static Stream<Amendment<Campaign>> amendments(String... roles) {
    return FAMILY.amendments().stream().filter(a -> List.of(roles).contains(a.roleLabel()));
  }

  static Stream<String> impliedAndSearch() {
    return amendments("implied", "search").map(Amendment::name);
  }

  static Stream<Set<String>> reformulations() {
    return amendments("reformulation")
        .map(
            amendment -> {
              Set<String> names = new LinkedHashSet<>(amendment.requires());
              names.add(amendment.name());
              return names;
            });
  }

  static Stream<String> symmetryAndDominance() {
    return amendments("symmetry", "dominance").map(Amendment::name);
  }

  /** Every set of symmetries and dominances that can stand together. */
  static Stream<Set<String>> combinations() {
    List<Set<String>> sets = new ArrayList<>(List.of(Set.of()));
    for (Amendment<Campaign> amendment : amendments("symmetry", "dominance").toList()) {
      for (Set<String> smaller : List.copyOf(sets)) {
        if (amendment.excludes().stream().noneMatch(smaller::contains)) {
          Set<String> larger = new LinkedHashSet<>(smaller);
          larger.add(amendment.name());
          sets.add(larger);
        }
      }
    }
    return sets.stream();
  }

  @ParameterizedTest
  @MethodSource("impliedAndSearch")
  void keeps_every_plan_whenGiven(String amendment) {
    for (Sample sample : SAMPLES) {
      assertThat(sample.judgedBy(sample.with(Set.of(amendment))))
          .as("%s", sample)
          .allSatisfy(plan -> assertThat(plan.violations()).isEmpty())
          .extracting(Judgement::objective)
          .isEqualTo(sample.plans.stream().map(Judgement::objective).toList());
    }
  }

  @ParameterizedTest
  @MethodSource("reformulations")
  void has_exactly_the_plans_of_plain_whenGiven(Set<String> amendments) {
    for (Sample sample : FEW_PLANS) {
      Model variant = sample.with(amendments);
      List<Judgement> solutions = AllSolutions.of(variant);
      assertThat(solutions).as("%s", sample).hasSameSizeAs(sample.plans);
      assertThat(solutions.stream().map(s -> sample.shared(variant, s)))
          .as("%s", sample)
          .containsExactlyInAnyOrderElementsOf(
              sample.plans.stream().map(p -> sample.shared(sample.plain, p)).toList());
    }
  }

  @ParameterizedTest
  @MethodSource("combinations")
  void keeps_a_cheapest_plan_whenGiven(Set<String> amendments) {
    for (Sample sample : SAMPLES) {
      Model variant = sample.with(amendments);
      assertThat(AllSolutions.minimum(sample.keptBy(variant)))
          .as("%s", sample)
          .isEqualTo(AllSolutions.minimum(sample.plans));
    }
  }

  @ParameterizedTest
  @MethodSource("symmetryAndDominance")
  void leaves_plans_out_somewhere_whenGiven(String amendment) {
    assertThat(SAMPLES)
        .anyMatch(
            sample -> sample.keptBy(sample.with(Set.of(amendment))).size() < sample.plans.size());
  }

  @ParameterizedTest
  @MethodSource("reformulations")
  void changes_the_model_somewhere_whenGiven(Set<String> amendments) {
    assertThat(SAMPLES).anyMatch(sample -> !isPlain(sample, amendments));
  }

  @ParameterizedTest
  @MethodSource("impliedAndSearch")
  void changes_the_model_or_the_search_somewhere_whenGiven(String amendment) {
    assertThat(SAMPLES).anyMatch(sample -> !isPlain(sample, Set.of(amendment)));
  }

  private static boolean isPlain(Sample sample, Set<String> amendments) {
    Model variant = sample.with(amendments);
    return variant.asBuilt().equals(sample.plain.asBuilt())
        && variant.search().equals(sample.plain.search());
  }

  @ParameterizedTest
  @ValueSource(strings = {"like-lots", "kilns-by-heat", "kilns-by-firings"})
  void what_is_alike_can_change_places_in_every_plan_and_one_way_is_kept(String amendment) {
    int moved = 0;
    for (Sample sample : SAMPLES) {
      Set<SortedMap<String, Integer>> plans = decisions(sample, sample.plans);
      Set<SortedMap<String, Integer>> kept =
          decisions(sample, sample.keptBy(sample.with(Set.of(amendment))));
      List<Permutation> generators = generators(amendment, sample.campaign);
      for (SortedMap<String, Integer> plan : plans) {
        Set<SortedMap<String, Integer>> orbit = orbit(plan, generators);
        assertThat(plans).as("%s", sample).containsAll(orbit);
        assertThat(orbit).as("%s", sample).anyMatch(kept::contains);
        moved += orbit.size() - 1;
      }
    }
    assertThat(moved).isPositive();
  }

  private static Set<SortedMap<String, Integer>> decisions(Sample sample, List<Judgement> plans) {
    Set<SortedMap<String, Integer>> decisions = new HashSet<>();
    plans.forEach(plan -> decisions.add(sample.decisions(plan)));
    return decisions;
  }

  private static List<Permutation> generators(String amendment, Campaign campaign) {
    return amendments("symmetry")
        .filter(a -> a.name().equals(amendment))
        .map(a -> ((Role.Symmetry) a.role(campaign)).generators())
        .findFirst()
        .orElseThrow();
  }

  /** What the generators make of a plan, one after the other, until nothing new comes. */
  private static Set<SortedMap<String, Integer>> orbit(
      SortedMap<String, Integer> plan, List<Permutation> generators) {
    Set<SortedMap<String, Integer>> orbit = new HashSet<>(Set.of(plan));
    Deque<SortedMap<String, Integer>> open = new ArrayDeque<>(orbit);
    while (!open.isEmpty()) {
      SortedMap<String, Integer> next = open.pop();
      for (Permutation generator : generators) {
        SortedMap<String, Integer> image = new TreeMap<>(next);
        generator.images().forEach((from, to) -> image.put(to, next.get(from)));
        if (orbit.add(image)) {
          open.push(image);
        }
      }
    }
    return orbit;
  }

  @Test
  void left_shift_keeps_every_plan_in_which_no_firing_can_be_a_day_earlier() {
    for (Sample sample : SAMPLES) {
      Set<SortedMap<String, Integer>> plans = decisions(sample, sample.plans);
      Set<SortedMap<String, Integer>> tight = new HashSet<>(plans);
      tight.removeIf(
          plan ->
              sample.campaign.firings().stream()
                  .anyMatch(firing -> plans.contains(sooner(plan, firing, sample.campaign))));
      assertThat(tight).as("%s", sample).isNotEmpty();
      assertThat(decisions(sample, sample.keptBy(sample.with(Set.of("left-shifted")))))
          .as("%s", sample)
          .containsAll(tight);
    }
  }

  /** The plan with a lit firing a day earlier; an unlit one only waits for those before it. */
  private static SortedMap<String, Integer> sooner(
      SortedMap<String, Integer> plan, Firing firing, Campaign campaign) {
    if (plan.get(Names.heat(firing)) == 0) {
      return new TreeMap<>();
    }
    SortedMap<String, Integer> changed = new TreeMap<>(plan);
    campaign.firings().stream()
        .filter(other -> other.kiln() == firing.kiln() && other.index() >= firing.index())
        .filter(other -> other.equals(firing) || isLastLit(plan, firing, other, campaign))
        .flatMap(other -> Stream.of(Names.start(other), Names.end(other)))
        .forEach(name -> changed.merge(name, -1, Integer::sum));
    campaign.lots().stream()
        .filter(lot -> plan.getOrDefault(Names.in(lot, firing), 0) == 1)
        .forEach(lot -> changed.merge(Names.out(lot), -1, Integer::sum));
    return changed;
  }

  /** Whether nothing is lit after {@code firing}, so that {@code other} waits for it alone. */
  private static boolean isLastLit(
      SortedMap<String, Integer> plan, Firing firing, Firing other, Campaign campaign) {
    return campaign.firings().stream()
        .filter(f -> f.kiln() == firing.kiln() && f.index() > firing.index())
        .filter(f -> f.index() <= other.index())
        .allMatch(f -> plan.get(Names.heat(f)) == 0);
  }
}
