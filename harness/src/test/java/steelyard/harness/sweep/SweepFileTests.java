package steelyard.harness.sweep;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Limits;
import steelyard.results.statistics.TieMargin;

class SweepFileTests {

  @TempDir Path folder;

  private static final String SHORT =
      """
      name: short
      family: kiln
      variants: plain
      backends: [cpsat]
      """;

  private static List<String> names(Sweep sweep) {
    return sweep.contests().get(0).candidates().stream().map(Candidate::name).toList();
  }

  private static List<String> variants(Sweep sweep) {
    return sweep.contests().get(0).candidates().stream().map(c -> c.variant().name()).toList();
  }

  private static List<String> instances(Sweep sweep) {
    return sweep.contests().get(0).instances().stream().map(Instance::name).toList();
  }

  private Sweep withVariants(String yaml) {
    return Samples.read(folder, SHORT.replace("variants: plain", "variants: " + yaml));
  }

  private Sweep withInstances(String yaml) {
    return Samples.read(folder, SHORT + "instances: " + yaml + "\n");
  }

  @Test
  void reads_theDocumentedExample() {
    Sweep sweep = SweepFile.read(Samples.resource("example.yaml"), Samples.catalogue());

    Contest contest = sweep.contests().get(0);
    assertThat(sweep.name()).isEqualTo("kiln-plan-spring");
    assertThat(sweep.notes()).startsWith("The load bound").contains("\nDoes that hold");
    assertThat(contest.candidates().stream().map(c -> c.variant().name()).distinct())
        .containsExactly(
            "plain",
            "plain+load-bound",
            "plain+kiln-order",
            "plain+shelf-table",
            "plain+load-bound+glaze-first");
    assertThat(contest.candidates().stream().map(c -> c.setup().name()).distinct())
        .containsExactly("sat", "cpsat", "cpsat-wide", "engine", "engine/luby");
    assertThat(contest.candidates()).hasSize(25);
    assertThat(instances(sweep))
        .containsExactly("spring/a1", "spring/a2", "autumn/11", "autumn/12");
    assertThat(contest.inService().name()).isEqualTo("plain on cpsat");
    assertThat(contest.pairs())
        .extracting(p -> p.before().name() + " -> " + p.after().name())
        .containsExactly(
            "plain on cpsat -> plain+load-bound on cpsat",
            "plain on engine -> plain on engine/luby");
    assertThat(sweep.seeds()).containsExactly(0L, 1L, 2L, 3L, 4L);
    assertThat(sweep.tieMargin()).isEqualTo(new TieMargin(0.1, 0.1));
    assertThat(sweep.penalty()).isEqualTo(10);
    assertThat(sweep.cores()).isEqualTo(4);
    assertThat(sweep.remarks()).isEmpty();
  }

  @Test
  void resolvesOptions_toEveryValueInForce() {
    Sweep sweep = SweepFile.read(Samples.resource("example.yaml"), Samples.catalogue());

    Setup wide = sweep.contests().get(0).candidates().get(2).setup();
    assertThat(wide.backend().adapter()).isEqualTo("cpsat");
    assertThat(wide.setting().name()).isEqualTo("default");
    assertThat(wide.setting().options())
        .isEqualTo(Map.of("linearization", "0", "presolve", "true"));
    assertThat(wide.threads()).isEqualTo(2);
    assertThat(wide.limits()).isEqualTo(new Limits(90, Optional.empty(), 1_500_000_000));
    Setup luby = sweep.contests().get(0).candidates().get(4).setup();
    assertThat(luby.setting().options()).isEqualTo(Map.of("restarts", "luby", "decay", "0.95"));
    assertThat(luby.threads()).isEqualTo(1);
  }

  /** The digest of "abc" is the example of FIPS 180-4's test data (SHA-256, one block). */
  @Test
  void carriesAllThatTheIndexSays_andTheContentsDigest() {
    Sweep sweep = SweepFile.read(Samples.resource("example.yaml"), Samples.catalogue());

    Instance first = sweep.contests().get(0).instances().get(0);
    assertThat(first.path()).isEqualTo(Samples.resource("kiln/spring/a1.txt"));
    assertThat(first.content())
        .isEqualTo(new Digest("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"));
    assertThat(first.bytes()).isEqualTo(3);
    assertThat(first.sets()).containsExactly("spring", "trouble");
    assertThat(first.instanceClass()).isEqualTo("large");
    assertThat(first.weight()).isEqualTo(3);
    assertThat(first.date()).contains(LocalDate.of(2026, 3, 2));
    assertThat(first.known()).isEqualTo(OptionalLong.of(118));
    Instance last = sweep.contests().get(0).instances().get(3);
    assertThat(last.weight()).isEqualTo(1);
    assertThat(last.date()).isEmpty();
    assertThat(last.known()).isEqualTo(OptionalLong.of(-5));
  }

  @Test
  void takesTheDefaults_whenTheFileIsShort() {
    Sweep sweep = Samples.read(folder, SHORT);

    assertThat(names(sweep)).containsExactly("plain on cpsat");
    assertThat(instances(sweep)).hasSize(6);
    assertThat(sweep.seeds()).containsExactly(0L);
    assertThat(sweep.contests().get(0).candidates().get(0).setup().limits())
        .isEqualTo(new Limits(60, Optional.empty(), 2_000_000_000));
    assertThat(sweep.tieMargin()).isEqualTo(new TieMargin(0.05, 0.05));
    assertThat(sweep.penalty()).isEqualTo(2);
    assertThat(sweep.cores()).isEqualTo(1);
    assertThat(sweep.blockSize()).isEqualTo(8);
    assertThat(sweep.contests().get(0).pairs()).isEmpty();
    assertThat(sweep.remarks()).containsExactly("kiln: no in-service given, taken: plain on cpsat");
  }

  @Test
  void pairsEachWithTheOneInService_whenNoPairsAreGiven() {
    Sweep sweep = Samples.read(folder, SHORT.replace("[cpsat]", "[sat, cpsat, engine]"));

    assertThat(sweep.contests().get(0).pairs())
        .extracting(p -> p.before().name() + " -> " + p.after().name())
        .containsExactly("plain on sat -> plain on cpsat", "plain on sat -> plain on engine");
  }

  @Test
  void ordersAmendmentsAsTheFamilyDeclaresThem() {
    assertThat(variants(withVariants("[plain+kiln-order+load-bound, plain + load-bound]")))
        .containsExactly("plain+load-bound+kiln-order", "plain+load-bound");
  }

  @Test
  void takesAmendmentsOneAtATime_withWhatTheyRequire() {
    assertThat(variants(withVariants("{one-at-a-time: all}")))
        .containsExactly(
            "plain",
            "plain+load-bound",
            "plain+kiln-order",
            "plain+shelf-table",
            "plain+load-bound+glaze-first");
  }

  @Test
  void leavesOutAndCounts_whatTheFamilyRulesOut() {
    Sweep sweep = withVariants("{all-subsets-of: [kiln-order, shelf-table, glaze-first]}");

    assertThat(variants(sweep)).containsExactly("plain", "plain+kiln-order", "plain+shelf-table");
    assertThat(sweep.contests().get(0).leftOut()).isEqualTo(5);
    assertThat(sweep.remarks()).contains("kiln: 5 combinations left out, ruled out by the family");
  }

  @Test
  void addsOntoAVariant_whenAsked() {
    assertThat(variants(withVariants("{one-at-a-time: [glaze-first], onto: plain+load-bound}")))
        .containsExactly("plain+load-bound", "plain+load-bound+glaze-first");
    Sweep all = withVariants("{one-at-a-time: all, onto: plain+kiln-order}");
    assertThat(variants(all))
        .containsExactly(
            "plain+kiln-order",
            "plain+load-bound+kiln-order",
            "plain+load-bound+kiln-order+glaze-first");
    assertThat(all.contests().get(0).leftOut()).isEqualTo(1);
  }

  @Test
  void mergesVariants_thatComeTwice() {
    assertThat(variants(withVariants("[plain, {all-subsets-of: [load-bound]}, plain+load-bound]")))
        .containsExactly("plain", "plain+load-bound");
  }

  @Test
  void selectsInstances_byNameAndPattern() {
    assertThat(instances(withInstances("spring/a2"))).containsExactly("spring/a2");
    assertThat(instances(withInstances("['*1', 'autumn/1?']")))
        .containsExactly("autumn/11", "spring/a1", "spring/b1", "autumn/12");
  }

  @Test
  void selectsInstances_bySetAndClass() {
    assertThat(instances(withInstances("{set: autumn, class: large}")))
        .containsExactly("autumn/12", "autumn/20");
    assertThat(instances(withInstances("{set: trouble}")))
        .containsExactly("autumn/11", "spring/a1");
    assertThat(instances(withInstances("[{class: small}, {set: [autumn, spring], names: '*2'}]")))
        .containsExactly("autumn/11", "spring/b1", "autumn/12", "spring/a2");
  }

  @Test
  void limitsByWork_inEachBackendsUnit() {
    Sweep sweep =
        Samples.read(
            folder,
            SHORT
                    .replace(
                        "[cpsat]", "[sat, {name: cp-b, backend: cpsat, options: {presolve: no}}]")
                    .replace("presolve: no", "presolve: false")
                + "limits: {work: {sat: 100000 conflicts, cpsat: 2.5 deterministic-seconds}}\n");

    List<Candidate> candidates = sweep.contests().get(0).candidates();
    assertThat(candidates.get(0).setup().limits())
        .isEqualTo(
            new Limits(600, Optional.of(new Limits.Work("conflicts", 100_000)), 2_000_000_000));
    assertThat(candidates.get(1).setup().limits().work())
        .contains(new Limits.Work("deterministic-seconds", 2.5));
  }

  @Test
  void takesOneAmountOfWork_forAllBackends() {
    Sweep sweep =
        Samples.read(
            folder, SHORT.replace("[cpsat]", "[sat, cpsat]") + "limits: {work: 500 conflicts}\n");

    assertThat(sweep.contests().get(0).candidates())
        .extracting(c -> c.setup().limits().work())
        .containsOnly(Optional.of(new Limits.Work("conflicts", 500)));
  }

  @Test
  void readsSeveralFamilies_eachWithItsOwnPart() {
    Sweep sweep =
        Samples.read(
            folder,
            """
            name: both
            backends: [sat, cpsat]
            seeds: [7, 3]
            families:
              - family: kiln
                variants: {one-at-a-time: [load-bound]}
                in-service: plain+load-bound on sat
              - family: yard
                variants: plain
                instances: {folder: %s, names: 'a*'}
            """
                .formatted(Samples.resource("kiln/spring")));

    assertThat(sweep.contests()).extracting(Contest::family).containsExactly("kiln", "yard");
    assertThat(sweep.contests().get(0).inService().name()).isEqualTo("plain+load-bound on sat");
    assertThat(sweep.contests().get(1).instances())
        .extracting(Instance::name)
        .containsExactly("a1", "a2");
    assertThat(sweep.seeds()).containsExactly(7L, 3L);
    assertThat(sweep.remarks()).containsExactly("yard: no in-service given, taken: plain on sat");
  }

  @Test
  void remarksOnThreads_whenSeedsAreFew() {
    Sweep sweep = Samples.read(folder, SHORT + "limits: {threads: 2}\n");

    assertThat(sweep.cores()).isEqualTo(2);
    assertThat(sweep.remarks())
        .contains(
            "cpsat has 2 threads, so its runs differ from one time to the next; 1 seed cannot tell"
                + " a gain from that, 5 may");
  }

  @Test
  void readsAFileWithAByteOrderMark() {
    assertThat(Samples.read(folder, "\uFEFF" + SHORT).name()).isEqualTo("short");
  }
}
