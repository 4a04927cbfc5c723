package steelyard.results.brief;

import static org.assertj.core.api.Assertions.assertThat;
import static steelyard.results.brief.Verdict.Standing.AHEAD;
import static steelyard.results.brief.Verdict.Standing.BARRED;
import static steelyard.results.brief.Verdict.Standing.BEHIND;
import static steelyard.results.brief.Verdict.Standing.NOT_WEIGHED;
import static steelyard.results.brief.Verdict.Standing.NO_CLEAR_DIFFERENCE;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import steelyard.results.brief.BriefContext.Plan;
import steelyard.results.brief.Facts.Against;
import steelyard.results.brief.Facts.Extreme;
import steelyard.results.brief.Facts.Tally;
import steelyard.results.brief.Verdict.Evidence;
import steelyard.results.brief.Verdict.Standing;
import steelyard.results.brief.Verdict.Weighed;
import steelyard.results.statistics.TimeRatio;
import steelyard.results.statistics.TimeRatio.Kind;

class VerdictTest {

  private static Evidence evidence(String name, int wins, int losses, double before, double after) {
    return new Evidence(
        name,
        new Against(
            "old",
            wins + losses,
            new Tally(wins, losses, 0, 0, 0),
            OptionalDouble.of(before),
            OptionalDouble.of(after),
            Optional.empty(),
            Optional.empty()),
        false);
  }

  private static Verdict weigh(int finished, Evidence... others) {
    Plan plan = new Plan("night", "old", 100, finished, Instant.EPOCH, Optional.empty(), "");
    return Verdict.of(plan, true, List.of(others), Rules.STANDARD.margin());
  }

  private static Standing standing(Evidence evidence) {
    return weigh(100, evidence).weighed().get(0).standing();
  }

  @Test
  void ahead_takesTheSplitAndTheMean() {
    assertThat(standing(evidence("new", 12, 2, 20, 10))).isEqualTo(AHEAD);
    assertThat(standing(evidence("new", 2, 12, 10, 20))).isEqualTo(BEHIND);
    assertThat(standing(evidence("new", 12, 2, 10, 20))).isEqualTo(NO_CLEAR_DIFFERENCE);
    assertThat(standing(evidence("new", 12, 2, 20, 19.5))).isEqualTo(NO_CLEAR_DIFFERENCE);
    assertThat(standing(evidence("new", 2, 12, 20, 10))).isEqualTo(NO_CLEAR_DIFFERENCE);
  }

  /** 8 : 2 is luck in 0.109 of sweeps, 9 : 1 in 0.0215, 6 : 0 in 0.031, 5 : 0 in 0.0625. */
  @Test
  void aSplitThatLuckCanGive_isNoClearDifference() {
    assertThat(standing(evidence("new", 8, 2, 20, 10))).isEqualTo(NO_CLEAR_DIFFERENCE);
    assertThat(standing(evidence("new", 9, 1, 20, 10))).isEqualTo(AHEAD);
    assertThat(standing(evidence("new", 6, 0, 20, 10))).isEqualTo(AHEAD);
    assertThat(standing(evidence("new", 5, 0, 20, 10))).isEqualTo(NO_CLEAR_DIFFERENCE);
  }

  /** The best of twelve looks good by luck: 6 : 0 no longer suffices. */
  @Test
  void manyCandidates_raiseTheBar() {
    List<Evidence> others = new ArrayList<>();
    others.add(evidence("lucky", 6, 0, 20, 10));
    for (int i = 0; i < 11; i++) {
      others.add(evidence("other" + i, 5, 5, 20, 20));
    }

    Verdict verdict = weigh(100, others.toArray(Evidence[]::new));

    assertThat(verdict.best()).isEmpty();
    assertThat(verdict.sentence())
        .isEqualTo(
            "On this evidence no candidate is ahead of old, which is in service."
                + " The others: 12 without a clear difference yet.");
  }

  @Test
  void names_whoIsAheadWithTheLowestMean() {
    Evidence good = evidence("good", 30, 2, 20, 10);
    Evidence better = evidence("better", 30, 2, 20, 5);
    Evidence worse = evidence("worse", 2, 30, 20, 50);

    Verdict verdict = weigh(60, good, better, worse);

    assertThat(verdict.best()).contains("better");
    assertThat(verdict.sentence())
        .isEqualTo(
            "On the runs so far (60 of 100) better is ahead of old, which is in service: better on"
                + " 30 of 32 instances, worse on 2, penalised mean time 5.00 s against 20.0 s."
                + " The others: 1 ahead too, 1 behind.");
  }

  @Test
  void doesNotHide_theWorstSlowdown() {
    Evidence plain = evidence("new", 30, 2, 20, 5);
    Against a = plain.against();
    Extreme worst = new Extreme("workshop", "la21", new TimeRatio(12, Kind.AT_LEAST));
    Against slower =
        new Against(
            a.before(),
            a.instances(),
            a.tally(),
            a.penalisedBefore(),
            a.penalisedAfter(),
            Optional.of(worst),
            Optional.empty());

    assertThat(weigh(100, new Evidence("new", slower, false)).sentence())
        .contains("at worst ≥ 12× as long, on la21");
  }

  @Test
  void bars_whoseAnswersDidNotStandUp() {
    Evidence fast = evidence("fast", 30, 0, 20, 1);
    Verdict verdict = weigh(100, new Evidence("fast", fast.against(), true));

    assertThat(verdict.weighed()).extracting(Weighed::standing).containsExactly(BARRED);
    assertThat(verdict.best()).isEmpty();
    assertThat(verdict.sentence()).startsWith("On this evidence fast is barred:");
  }

  @Test
  void saysSo_whenThereIsNothingToWeigh() {
    Against nothing =
        new Against(
            "old",
            0,
            new Tally(0, 0, 0, 0, 0),
            OptionalDouble.empty(),
            OptionalDouble.empty(),
            Optional.empty(),
            Optional.empty());

    assertThat(standing(new Evidence("new", nothing, false))).isEqualTo(NOT_WEIGHED);
    assertThat(weigh(100).sentence())
        .isEqualTo("Only old, which is in service, has run: there is nothing to weigh.");
  }

  @Test
  void givesTheReason_forASingleCandidate() {
    assertThat(weigh(100, evidence("new", 1, 0, 20, 10)).sentence())
        .isEqualTo(
            "On this evidence new shows no clear difference yet from old, which is in service:"
                + " only 1 instance tells the two apart; it takes at least 6.");
  }
}
