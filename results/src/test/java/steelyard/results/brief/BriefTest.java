package steelyard.results.brief;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static steelyard.results.brief.RunMaker.found;
import static steelyard.results.brief.RunMaker.open;
import static steelyard.results.brief.RunMaker.proved;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import steelyard.results.brief.BriefContext.Asked;
import steelyard.results.brief.BriefContext.Finding;
import steelyard.results.brief.BriefContext.Gravity;
import steelyard.results.brief.BriefContext.Plan;
import steelyard.results.brief.BriefContext.Site;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.Extreme;
import steelyard.results.brief.Facts.GroundCount;
import steelyard.results.brief.Facts.Open;
import steelyard.results.brief.Facts.Pair;
import steelyard.results.brief.Facts.Row;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.brief.Facts.Trouble;
import steelyard.results.brief.Verdict.Standing;
import steelyard.results.brief.Verdict.Weighed;
import steelyard.results.ledger.Check;
import steelyard.results.ledger.Claim;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Status;
import steelyard.results.statistics.PairRule.Ground;
import steelyard.results.statistics.TimeRatio;
import steelyard.results.statistics.TimeRatio.Kind;

class BriefTest {

  /** Three candidates on six instances under 60 s; NaN hit the limit. A is in service. */
  private static final double[][] TOY = {
    {1, 4, 20, Double.NaN, 0.5, 50},
    {2, 2, 30, 40, Double.NaN, 12},
    {8, 16, Double.NaN, 30, 4, Double.NaN},
  };

  private static List<Observation> toy() {
    List<Observation> runs = new ArrayList<>();
    for (int c = 0; c < TOY.length; c++) {
      for (int i = 0; i < TOY[c].length; i++) {
        String variant = "ABC".substring(c, c + 1);
        double seconds = TOY[c][i];
        String instance = "i" + (i + 1);
        runs.add(
            (Double.isNaN(seconds) ? open(variant, instance) : proved(variant, instance, seconds))
                .make());
      }
    }
    return runs;
  }

  private static BriefContext context(String inService, List<Finding> findings) {
    return new BriefContext(
        new Plan("night", inService, 18, 18, Instant.EPOCH, Optional.empty(), ""),
        new Site("bench", "steady", List.of()),
        Rules.STANDARD,
        List.of(),
        findings,
        "repeat {run} now");
  }

  private static Facts brief(String inService, List<Observation> runs) {
    return Brief.of(context(inService, List.of()), runs);
  }

  private static Facts twoOf(RunMaker before, RunMaker after) {
    return brief("A on cpsat", List.of(before.make(), after.make()));
  }

  private static Tally onlyTally(Facts facts) {
    return facts.pairs().get(0).total().tally();
  }

  @Test
  void scoresEveryCandidate_asComputedByHand() {
    List<Row> rows = brief("A on cpsat", toy()).candidates();

    assertThat(rows)
        .extracting(Row::candidate)
        .containsExactly("A on cpsat", "B on cpsat", "C on cpsat");
    assertThat(rows).extracting(Row::inService).containsExactly(true, false, false);
    assertThat(rows).extracting(r -> r.score().solved()).containsExactly(5.0, 5.0, 4.0);
    double[] penalised = {32.583333, 34.333333, 49.666667};
    double[] geometric = {8.966326, 13.441430, 20.099903};
    for (int i = 0; i < rows.size(); i++) {
      assertThat(rows.get(i).score().penalisedMean()).hasValueCloseTo(penalised[i], within(5e-7));
      assertThat(rows.get(i).score().shiftedGeometricMean())
          .hasValueCloseTo(geometric[i], within(5e-7));
    }
  }

  @Test
  void weighsEveryCandidate_againstTheOneInService() {
    List<Pair> pairs = brief("A on cpsat", toy()).pairs();

    assertThat(pairs).extracting(Pair::after).containsExactly("B on cpsat", "C on cpsat");
    Against b = pairs.get(0).total();
    assertThat(b.tally()).isEqualTo(new Tally(3, 3, 0, 0, 0));
    Against c = pairs.get(1).total();
    assertThat(c.tally()).isEqualTo(new Tally(1, 5, 0, 0, 0));
    // Of 8/1, 16/4, ≥ 60/20, 4/0.5 and ≥ 60/50 the first of the largest; of wins only ≤ 30/60.
    assertThat(c.worstSlowdown())
        .contains(new Extreme("workshop", "i1", new TimeRatio(8, Kind.EXACT)));
    assertThat(c.bestSpeedup())
        .contains(new Extreme("workshop", "i4", new TimeRatio(0.5, Kind.AT_MOST)));
    assertThat(pairs.get(1).open()).isEqualTo(new Open(1, 2, 0));
    assertThat(pairs.get(1).grounds())
        .contains(new GroundCount(Ground.PROOF, 1, 2), new GroundCount(Ground.TIME, 0, 3));
  }

  @Test
  void comparesTheGivenPairs_whenAsked() {
    BriefContext standard = context("A on cpsat", List.of());
    BriefContext asking =
        new BriefContext(
            standard.plan(),
            standard.site(),
            standard.rules(),
            List.of(new Asked("C on cpsat", "B on cpsat")),
            List.of(),
            standard.rerun());

    List<Pair> pairs = Brief.of(asking, toy()).pairs();

    assertThat(pairs).hasSize(1);
    assertThat(onlyTally(Brief.of(asking, toy()))).isEqualTo(new Tally(4, 2, 0, 0, 0));
    assertThatThrownBy(() -> new Asked("A", "A")).hasMessageContaining("itself");
  }

  @Test
  void countsAnUnchangedModel_asNeitherWinNorTie() {
    Facts facts = twoOf(proved("A", "i1", 1).model("same"), proved("B", "i1", 30).model("same"));

    assertThat(onlyTally(facts)).isEqualTo(new Tally(0, 0, 0, 0, 1));
    assertThat(facts.pairs().get(0).total().worstSlowdown()).isEmpty();
  }

  @Test
  void aRunThatStandsForBoth_isUnchanged() {
    Facts facts = twoOf(proved("A", "i1", 1).run("r1"), proved("B", "i1", 1).run("r1"));

    assertThat(onlyTally(facts)).isEqualTo(new Tally(0, 0, 0, 0, 1));
  }

  @Test
  void theSameModelOnAnotherBackend_isNotUnchanged() {
    Facts facts =
        twoOf(
            proved("A", "i1", 1).model("same"), proved("A", "i1", 30).model("same").backend("sat"));

    assertThat(onlyTally(facts)).isEqualTo(new Tally(0, 1, 0, 0, 0));
  }

  @Test
  void runsThatBothHitTheLimit_areOpen_unlessOneFoundMore() {
    assertThat(onlyTally(twoOf(found("A", "i1", 7), found("B", "i1", 7))).bothOpen()).isOne();
    assertThat(onlyTally(twoOf(found("A", "i1", 7), found("B", "i1", 6))).wins()).isOne();
    assertThat(
            onlyTally(twoOf(found("A", "i1", 7).maximize(), found("B", "i1", 6).maximize()))
                .losses())
        .isOne();
  }

  @Test
  void neverPairs_acrossBlocks() {
    Pair pair = twoOf(proved("A", "i1", 1).block(1), proved("B", "i1", 9).block(2)).pairs().get(0);

    assertThat(pair.points()).isEmpty();
    assertThat(pair.unpaired()).isOne();
    assertThat(pair.total().penalisedAfter()).isEmpty();
  }

  @Test
  void takesTheInstanceAsUnit_whenSeedsDiffer() {
    List<Observation> runs =
        List.of(
            proved("A", "i1", 10).seed(0).make(),
            proved("A", "i1", 10).seed(1).make(),
            proved("A", "i1", 10).seed(2).make(),
            proved("B", "i1", 5).seed(0).make(),
            proved("B", "i1", 5).seed(1).make(),
            open("B", "i1").seed(2).make());

    Facts facts = brief("A on cpsat", runs);

    assertThat(onlyTally(facts)).isEqualTo(new Tally(1, 0, 0, 0, 0));
    assertThat(facts.candidates().get(1).score().solved()).isCloseTo(2 / 3.0, within(1e-12));
    // (5 + 5 + 2 · 60) / 3
    assertThat(facts.candidates().get(1).score().penalisedMean())
        .hasValueCloseTo(130 / 3.0, within(1e-12));
  }

  @Test
  void aLaterRun_replacesAnEarlier_ofTheSameCell() {
    Facts facts =
        brief(
            "A on cpsat",
            List.of(
                proved("A", "i1", 50).run("first").make(),
                proved("A", "i1", 2).run("second").make()));

    assertThat(facts.runs()).extracting(Facts.Run::run).containsExactly("second");
    assertThat(facts.candidates().get(0).score().penalisedMean()).hasValue(2);
  }

  @Test
  void stoppedRuns_areShown_butCountForNothing() {
    Facts facts = twoOf(proved("A", "i1", 5), open("B", "i1").ending(Ending.STOPPED));

    assertThat(facts.runs()).hasSize(2);
    assertThat(facts.candidates().get(1).score().instances()).isZero();
    assertThat(facts.candidates().get(1).score().penalisedMean()).isEmpty();
    assertThat(facts.troubles()).extracting(Trouble::text).anyMatch(t -> t.contains("stopped"));
  }

  @Test
  void aCrash_countsAsItsLimit_notAsTheTimeItTook() {
    Facts facts = twoOf(proved("A", "i1", 5), open("B", "i1").ending(Ending.CRASHED));

    assertThat(facts.candidates().get(1).score().penalisedMean()).hasValue(120);
    assertThat(facts.troubles().get(0))
        .isEqualTo(
            new Trouble(Gravity.WRONG, "B on cpsat crashed (1 run).", List.of("B.cpsat.i1.0.1")));
  }

  @Test
  void refusedAndContradictedAnswers_areWorthNothing() {
    Tally invalid =
        onlyTally(twoOf(proved("A", "i1", 50), proved("B", "i1", 1).check(Check.INVALID)));
    Tally refuted =
        onlyTally(
            twoOf(
                proved("A", "i1", 50),
                open("B", "i1")
                    .status(Status.INFEASIBLE)
                    .ending(Ending.COMPLETED)
                    .claim(Claim.CONTRADICTED)));

    assertThat(invalid.losses()).isOne();
    assertThat(refuted.losses()).isOne();
  }

  @Test
  void times_areNotCompared_underAWorkLimit() {
    Limits work = new Limits(60, Optional.of(new Limits.Work("conflicts", 1000)), 1L << 30);

    Facts facts = twoOf(proved("A", "i1", 1).limits(work), proved("B", "i1", 30).limits(work));

    assertThat(facts.scope().timed()).isFalse();
    assertThat(onlyTally(facts).ties()).isOne();
    assertThat(facts.candidates().get(0).score().penalisedMean()).isEmpty();
  }

  @Test
  void differentLimits_areNeverPaired() {
    Limits longer = new Limits(90, Optional.empty(), 1L << 30);

    assertThat(
            twoOf(proved("A", "i1", 1), proved("B", "i1", 1).limits(longer))
                .pairs()
                .get(0)
                .points())
        .isEmpty();
  }

  @Test
  void splitsByClass_inNaturalOrder() {
    List<Observation> runs = new ArrayList<>();
    for (String name : List.of("c10", "c2", "c1")) {
      runs.add(proved("A", "of-" + name, 3).inClass(name).make());
      runs.add(proved("B", "of-" + name, 1).inClass(name).make());
    }

    Facts facts = brief("A on cpsat", runs);

    assertThat(facts.scope().classes()).containsExactly("c1", "c2", "c10");
    assertThat(facts.classes())
        .extracting(Facts.ClassTable::instanceClass)
        .containsExactly("c1", "c2", "c10");
    assertThat(facts.pairs().get(0).classes())
        .allMatch(some -> some.against().tally().equals(new Tally(1, 0, 0, 0, 0)));
    assertThat(brief("A on cpsat", toy()).classes()).isEmpty();
  }

  @Test
  void ordersTroubles_byGravity_andKeepsWhatOthersFound() {
    Finding refuted =
        new Finding(Gravity.WRONG, "heads is not implied.", Optional.of("B on cpsat"), List.of());

    Facts facts =
        Brief.of(
            context("A on cpsat", List.of(refuted)),
            List.of(
                proved("A", "i1", 5).disturbed().make(),
                proved("A", "i2", 5).check(Check.UNCHECKED).make(),
                open("B", "i1").ending(Ending.UNSUPPORTED).make(),
                open("B", "i2").ending(Ending.MEMORY_LIMIT).make()));

    assertThat(facts.troubles()).extracting(Trouble::gravity).isSorted();
    assertThat(facts.troubles())
        .extracting(Trouble::text)
        .containsExactly(
            "heads is not implied.",
            "B on cpsat asked for more memory than it was allowed (1 run).",
            "B on cpsat was refused by its backend (1 run).",
            "A on cpsat was disturbed by the machine, so that its time may be too long (1 run).",
            "A on cpsat has a solution that was not judged yet (1 run).");
    assertThat(facts.verdict().weighed())
        .extracting(Weighed::standing)
        .containsExactly(Standing.BARRED);
  }

  @Test
  void says_howToRepeatARun() {
    Facts facts = twoOf(proved("A", "i1", 1).run("7f3a-2"), proved("B", "i1", 1).run("it's; rm"));

    assertThat(facts.runs())
        .extracting(Facts.Run::rerun)
        .containsExactly("repeat 7f3a-2 now", "repeat 'it'\\''s; rm' now");
  }

  @Test
  void saysNothing_beyondWhatThereIs_withoutRuns() {
    Facts facts = brief("A on cpsat", List.of());

    assertThat(facts.candidates()).isEmpty();
    assertThat(facts.pairs()).isEmpty();
    assertThat(facts.verdict().best()).isEmpty();
    assertThat(facts.verdict().sentence()).contains("no finished run yet");
  }

  @Test
  void doesNotDepend_onTheOrderOfRuns() {
    List<Observation> backwards = new ArrayList<>(toy());
    Collections.reverse(backwards);

    assertThat(brief("A on cpsat", backwards)).isEqualTo(brief("A on cpsat", toy()));
  }
}
