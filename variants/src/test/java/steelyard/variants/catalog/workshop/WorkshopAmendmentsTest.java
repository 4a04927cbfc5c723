package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayDeque;
import java.util.Deque;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.AllSolutions;
import steelyard.variants.family.Answers;
import steelyard.variants.family.Variant;
import steelyard.variants.model.Model;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/** Each amendment is what its role says, on every plan of small workshops. */
class WorkshopAmendmentsTest {
  private static final WorkshopFamily FAMILY = new WorkshopFamily();
  private static final List<Sample> SAMPLES =
      LongStream.range(0, 60).mapToObj(RandomWorkshop::of).map(Sample::of).toList();

  /** A workshop with all its plans. */
  private record Sample(Workshop workshop, Model plain, List<Judgement> plans) {
    static Sample of(Workshop workshop) {
      Model plain = Variant.PLAIN.build(FAMILY, workshop);
      return new Sample(workshop, plain, AllSolutions.of(plain));
    }

    /** The model with the amendments, named between commas. */
    Model with(String amendments) {
      return Variant.of(FAMILY, List.of(amendments.split(",", -1))).build(FAMILY, workshop);
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

    /** The starts alone, by name. */
    Set<SortedMap<String, Integer>> starts(List<Judgement> judgements) {
      Set<SortedMap<String, Integer>> starts = new HashSet<>();
      for (Judgement judgement : judgements) {
        SortedMap<String, Integer> values = new TreeMap<>();
        plain.variables().decisions().stream()
            .forEach(v -> values.put(plain.variables().name(v), judgement.complete().get(v)));
        starts.add(values);
      }
      return starts;
    }

    @Override
    public String toString() {
      return workshop.toString();
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "load-bound",
        "load-from-first",
        "work-left",
        "orders",
        "orders,transitive-orders",
        "earliest-first",
        "orders,order-first",
        "greedy-hint"
      })
  void keeps_every_plan_whenGiven(String amendments) {
    for (Sample sample : SAMPLES) {
      assertThat(sample.judgedBy(sample.with(amendments)))
          .as("%s", sample)
          .allSatisfy(plan -> assertThat(plan.violations()).isEmpty())
          .extracting(Judgement::objective)
          .isEqualTo(sample.plans.stream().map(Judgement::objective).toList());
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"no-overlap", "cumulative"})
  void has_exactly_the_plans_of_plain_whenGiven(String reformulation) {
    for (Sample sample : SAMPLES) {
      Model variant = sample.with(reformulation);
      assertThat(AllSolutions.of(variant).stream().map(s -> Answers.of(variant, s)))
          .as("%s", sample)
          .isEqualTo(sample.plans.stream().map(s -> Answers.of(sample.plain, s)).toList());
    }
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "left-shifted",
        "twin-order",
        "left-shifted,twin-order",
        "no-overlap,load-bound,load-from-first,work-left,orders,transitive-orders,left-shifted,"
            + "twin-order,order-first,greedy-hint"
      })
  void keeps_a_shortest_plan_whenGiven(String amendments) {
    for (Sample sample : SAMPLES) {
      Model variant = sample.with(amendments);
      assertThat(AllSolutions.minimum(sample.keptBy(variant)))
          .as("%s", sample)
          .isEqualTo(AllSolutions.minimum(sample.plans));
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"left-shifted", "twin-order"})
  void leaves_plans_out_somewhere_whenGiven(String amendment) {
    assertThat(SAMPLES)
        .anyMatch(sample -> sample.keptBy(sample.with(amendment)).size() < sample.plans.size());
  }

  @Test
  void left_shift_keeps_exactly_the_plans_in_which_no_start_can_be_a_minute_earlier() {
    for (Sample sample : SAMPLES) {
      Set<SortedMap<String, Integer>> plans = sample.starts(sample.plans);
      Set<SortedMap<String, Integer>> tight = new HashSet<>(plans);
      tight.removeIf(plan -> plan.keySet().stream().anyMatch(s -> plans.contains(sooner(plan, s))));
      assertThat(sample.starts(sample.keptBy(sample.with("left-shifted"))))
          .as("%s", sample)
          .isEqualTo(tight);
    }
  }

  private static SortedMap<String, Integer> sooner(SortedMap<String, Integer> plan, String start) {
    SortedMap<String, Integer> changed = new TreeMap<>(plan);
    changed.merge(start, -1, Integer::sum);
    return changed;
  }

  @Test
  void twins_can_change_places_in_every_plan_and_one_order_of_them_is_kept() {
    for (Sample sample : SAMPLES) {
      Set<SortedMap<String, Integer>> plans = sample.starts(sample.plans);
      Set<SortedMap<String, Integer>> kept =
          sample.starts(sample.keptBy(sample.with("twin-order")));
      for (SortedMap<String, Integer> plan : plans) {
        Set<SortedMap<String, Integer>> orbit = orbit(plan, generators(sample.workshop));
        assertThat(plans).as("%s", sample).containsAll(orbit);
        assertThat(orbit).as("%s", sample).anyMatch(kept::contains);
      }
    }
  }

  private static List<Permutation> generators(Workshop workshop) {
    return ((Role.Symmetry) new TwinOrder().role(workshop)).generators();
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
  void the_load_bound_is_the_optimum_of_some_workshops_and_above_the_longest_route_of_some() {
    assertThat(SAMPLES)
        .anyMatch(sample -> AllSolutions.minimum(sample.plans).getAsLong() == bound(sample))
        .anyMatch(sample -> bound(sample) > longestRoute(sample));
  }

  private static long bound(Sample sample) {
    return IntStream.range(0, sample.workshop.stations())
        .map(station -> JacksonBound.of(sample.workshop.visits(station)))
        .max()
        .orElseThrow();
  }

  private static long longestRoute(Sample sample) {
    return sample.workshop.moulds().stream()
        .mapToInt(mould -> mould.minutes(0) + mould.tail(0))
        .max()
        .orElseThrow();
  }

  @Test
  void posts_nothing_whenGiven_no_twins() {
    Workshop workshop = Workshops.shipped("ft06");
    assertThat(generators(workshop)).isEmpty();
    assertThat(Variant.of(FAMILY, Set.of("twin-order")).build(FAMILY, workshop).asBuilt())
        .isEqualTo(Variant.PLAIN.build(FAMILY, workshop).asBuilt());
  }

  @ParameterizedTest
  @ValueSource(strings = {"no-overlap", "cumulative"})
  void leaves_the_model_as_it_is_whenGiven_a_single_mould(String reformulation) {
    Workshop workshop = new Workshop(1, List.of(new Mould(List.of(new Operation(0, 3)))));
    assertThat(Variant.of(FAMILY, Set.of(reformulation)).build(FAMILY, workshop).asBuilt())
        .isEqualTo(Variant.PLAIN.build(FAMILY, workshop).asBuilt());
  }

  @Test
  void hints_a_whole_plan() {
    for (Sample sample : SAMPLES) {
      Model variant = sample.with("greedy-hint");
      int[] hinted = variant.hint().values().toArray();
      Judgement judgement = new Evaluator(sample.plain).judge(hinted);
      assertThat(variant.hint().variables()).isEqualTo(sample.plain.variables().decisions());
      assertThat(judgement.violations()).as("%s", sample).isEmpty();
      assertThat(judgement.objective()).hasValue(GreedyPlan.of(sample.workshop).makespan());
    }
  }
}
