package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.results.ledger.RunKey;

class PlanTests {

  /** A sweep of one or two families, up to 30 candidates, 60 instances, 6 classes, 3 seeds. */
  private static Sweep random(long seed) {
    UniformRandomProvider random = new SplitMix64(seed);
    List<Contest> contests = new ArrayList<>();
    for (int i = random.nextInt(2); i >= 0; i--) {
      int candidates = 1 + random.nextInt(30);
      int instances = 1 + random.nextInt(60);
      int classes = 1 + random.nextInt(6);
      contests.add(Samples.contest(random, "family" + i, candidates, instances, classes));
    }
    int seeds = 1 + random.nextInt(3);
    return Samples.sweep("sweep" + seed, contests, seeds, 2 + random.nextInt(9));
  }

  private record Run(Contest contest, Candidate candidate, Instance instance, long seed) {}

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void runsEveryCandidateOnceOnEverySeedOfEveryInstance(long seed) {
    Sweep sweep = random(seed);
    Map<Run, Integer> runs = new HashMap<>();
    for (Block block : Plan.of(sweep).blocks()) {
      for (Candidate c : block.order()) {
        runs.merge(new Run(block.contest(), c, block.instance(), block.seed()), 1, Integer::sum);
      }
    }
    int planned = 0;
    for (Contest contest : sweep.contests()) {
      planned += contest.candidates().size() * contest.instances().size() * sweep.seeds().size();
    }
    assertThat(runs).hasSize(planned);
    runs.forEach(
        (run, times) -> {
          if (!run.candidate().equals(run.contest().inService())) {
            assertThat(times).as("%s", run).isEqualTo(1);
          }
        });
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void hasTheOneInServiceInEveryBlock_andNoBlockTooLarge(long seed) {
    Sweep sweep = random(seed);
    List<Block> blocks = Plan.of(sweep).blocks();
    for (Block block : blocks) {
      assertThat(block.number()).isEqualTo(blocks.indexOf(block));
      assertThat(block.order()).contains(block.contest().inService()).doesNotHaveDuplicates();
      assertThat(block.order()).hasSizeLessThanOrEqualTo(sweep.blockSize());
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void finishesTheFirstSeed_beforeTheSecondBegins(long seed) {
    List<Long> order = Plan.of(random(seed)).blocks().stream().map(Block::seed).toList();

    assertThat(order).isSorted();
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void hasRunTheCandidatesOfAFamilyEquallyOften_inEveryPrefix(long seed) {
    Sweep sweep = random(seed);
    Map<String, Map<String, Integer>> times = new HashMap<>();
    for (Contest contest : sweep.contests()) {
      Map<String, Integer> zero = new LinkedHashMap<>();
      contest.candidates().forEach(c -> zero.put(c.name(), 0));
      zero.remove(contest.inService().name());
      times.put(contest.family(), zero);
    }
    for (Block block : Plan.of(sweep).blocks()) {
      Map<String, Integer> counts = times.get(block.contest().family());
      block.order().forEach(c -> counts.computeIfPresent(c.name(), (name, n) -> n + 1));
      if (!counts.isEmpty()) {
        int most = counts.values().stream().max(Integer::compare).orElseThrow();
        int least = counts.values().stream().min(Integer::compare).orElseThrow();
        assertThat(most - least).as("after block %s", block.number()).isLessThanOrEqualTo(1);
      }
    }
  }

  /** The bound is that of the theorem: Tijdeman (1980), 1 - 1/(2k - 2) for k classes. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
  void keepsEveryClassNearItsShare_inEveryPrefix(long seed) {
    Sweep sweep = random(seed);
    Map<String, Integer> sizes = new LinkedHashMap<>();
    for (Contest contest : sweep.contests()) {
      contest.instances().forEach(i -> sizes.merge(classOf(contest, i), 1, Integer::sum));
    }
    int total = sizes.values().stream().mapToInt(Integer::intValue).sum();
    double bound = sizes.size() == 1 ? 0 : 1 - 1.0 / (2 * sizes.size() - 2);
    Map<String, Integer> seen = new HashMap<>();
    Set<String> started = new HashSet<>();
    for (Block block : Plan.of(sweep).blocks()) {
      if (started.add(block.contest().family() + block.instance().name() + " " + block.seed())) {
        seen.merge(classOf(block.contest(), block.instance()), 1, Integer::sum);
        sizes.forEach(
            (label, size) ->
                assertThat((double) seen.getOrDefault(label, 0))
                    .as("%s after %s instances", label, started.size())
                    .isCloseTo((double) size * started.size() / total, within(bound + 1e-9)));
      }
    }
  }

  private static String classOf(Contest contest, Instance instance) {
    return contest.family() + "/" + instance.instanceClass();
  }

  @Test
  void takesHeavyInstancesFirst_andEquallyHeavyOnesAcrossTheirSizes() {
    List<Instance> instances = new ArrayList<>();
    for (int size = 1; size <= 8; size++) {
      instances.add(Samples.instance("s" + size, "c", 1, size * 100L));
    }
    instances.add(Samples.instance("heavy", "c", 2.5, 5000));

    // 0..7 with their three bits reversed: 0 4 2 6 1 5 3 7 (van der Corput 1935, base 2).
    assertThat(FairOrder.within(instances))
        .extracting(Instance::name)
        .containsExactly("heavy", "s1", "s5", "s3", "s7", "s2", "s6", "s4", "s8");
  }

  @Test
  void alternatesTwoClassesOfEqualSize() {
    assertThat(FairOrder.merge(List.of(List.of("a", "b", "c"), List.of("x", "y", "z"))))
        .containsExactly("a", "x", "b", "y", "c", "z");
    assertThat(FairOrder.merge(List.of(List.of("a", "b", "c", "d"), List.of(), List.of("x", "y"))))
        .containsExactly("a", "x", "b", "c", "y", "d");
    assertThat(FairOrder.merge(List.<List<String>>of())).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void isTheSamePlan_whenMadeAgain(long seed) {
    Plan plan = Plan.of(random(seed));

    assertThat(Plan.of(random(seed))).isEqualTo(plan);
    assertThat(Plan.of(random(seed + 100))).isNotEqualTo(plan);
  }

  @Test
  void shufflesEachBlockByItself() {
    Sweep sweep =
        Samples.sweep("a", List.of(Samples.contest(new SplitMix64(5), "f", 8, 50, 2)), 2, 8);
    Plan plan = Plan.of(sweep);
    int[] positions = new int[8];
    for (Block block : plan.blocks()) {
      positions[block.order().indexOf(block.contest().inService())]++;
    }

    assertThat(plan.blocks()).hasSize(100);
    assertThat(positions).as("of the one in service").doesNotContain(0);
    Plan renamed = Plan.of(Samples.sweep("b", sweep.contests(), 2, 8));
    assertThat(renamed.blocks().stream().map(Block::order).toList())
        .isNotEqualTo(plan.blocks().stream().map(Block::order).toList());
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
  void keepsPairsTogether_whereTheirChainFitsIntoABlock(long seed) {
    Sweep sweep = random(seed);
    Plan.Summary summary = Plan.of(sweep).summary();
    for (Pair apart : summary.pairsApart()) {
      Contest contest =
          sweep.contests().stream()
              .filter(c -> c.pairs().contains(apart))
              .findFirst()
              .orElseThrow();
      assertThat(chain(contest, apart.before()))
          .as("%s", apart)
          .hasSizeGreaterThan(sweep.blockSize() - 1);
    }
  }

  /** All candidates that pairs connect with this one, the one in service aside. */
  private static Set<Candidate> chain(Contest contest, Candidate start) {
    Set<Candidate> chain = new HashSet<>(Set.of(start));
    boolean grew = true;
    while (grew) {
      grew = false;
      for (Pair pair : contest.pairs()) {
        boolean free =
            !pair.before().equals(contest.inService()) && !pair.after().equals(contest.inService());
        if (free && (chain.contains(pair.before()) || chain.contains(pair.after()))) {
          grew |= chain.add(pair.before());
          grew |= chain.add(pair.after());
        }
      }
    }
    return chain;
  }

  @Test
  void splitsCandidatesEvenly_whenNothingHoldsThemTogether() {
    Contest drawn = Samples.contest(new SplitMix64(3), "f", 30, 1, 1);
    Contest contest =
        new Contest(
            "f",
            drawn.codes(),
            drawn.candidates(),
            drawn.inService(),
            List.of(),
            drawn.instances(),
            0);

    assertThat(Heats.of(contest, 8)).extracting(List::size).containsExactly(7, 7, 7, 7, 6);
  }

  @Test
  void sumsUp_whatIsPlanned() {
    Contest drawn = Samples.contest(new SplitMix64(3), "f", 10, 5, 2);
    Contest contest =
        new Contest(
            "f",
            drawn.codes(),
            drawn.candidates(),
            drawn.inService(),
            List.of(),
            drawn.instances(),
            4);
    Plan.Summary summary = Plan.of(Samples.sweep("s", List.of(contest), 3, 8)).summary();

    // Ten candidates make two blocks, of 6 and 5 runs with the one in service in both: 11 runs on
    // each of 5 instances with 3 seeds, each of at most 10 s and 0.8 s of grace on one core.
    assertThat(summary.candidates()).isEqualTo(10);
    assertThat(summary.instances()).isEqualTo(5);
    assertThat(summary.seeds()).isEqualTo(3);
    assertThat(summary.blocks()).isEqualTo(30);
    assertThat(summary.runs()).isEqualTo(165);
    assertThat(summary.coreHoursAtWorst()).isCloseTo(165 * 10.8 / 3600, within(1e-9));
    assertThat(summary.hoursAtWorst()).isEqualTo(summary.coreHoursAtWorst());
    assertThat(summary.leftOut()).isEqualTo(4);
    assertThat(summary.pairsApart()).isEmpty();
  }

  @Test
  void givesABlockFile_itsRunsInOrder() {
    Plan plan = Plan.of(random(4));
    Block block = plan.blocks().get(plan.blocks().size() - 1);
    RunKey key = new RunKey(1, 2);

    BlockFile file =
        BlockFile.of(block, "abcd", "s", Samples.resource("kiln"), candidate -> Optional.of(key));
    assertThat(file.runs())
        .extracting(BlockFile.Run::candidate)
        .containsExactlyElementsOf(block.order().stream().map(Candidate::name).toList());
    assertThat(file.runs().stream().filter(BlockFile.Run::inService)).hasSize(1);
  }
}
