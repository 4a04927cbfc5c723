package steelyard.results.statistics;

import static org.assertj.core.api.Assertions.assertThat;
import static steelyard.results.statistics.Outcome.BOTH_OPEN;
import static steelyard.results.statistics.Outcome.LOSS;
import static steelyard.results.statistics.Outcome.TIE;
import static steelyard.results.statistics.Outcome.UNCHANGED;
import static steelyard.results.statistics.Outcome.WIN;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import steelyard.results.statistics.PairRule.Comparison;
import steelyard.results.statistics.PairRule.Ground;

class PairRuleTest {

  private static final PairRule RULE = new PairRule(new TieMargin(0.05, 0.05));

  private static Attainment proved(long cost, double seconds) {
    return new Attainment(true, true, OptionalLong.of(cost), OptionalDouble.of(seconds));
  }

  private static Attainment found(long cost) {
    return new Attainment(false, true, OptionalLong.of(cost), OptionalDouble.of(60));
  }

  private static final Attainment NOTHING =
      new Attainment(false, false, OptionalLong.empty(), OptionalDouble.of(60));

  private static void expect(Attainment before, Attainment after, Outcome outcome, Ground ground) {
    assertThat(RULE.compare(before, after)).isEqualTo(new Comparison(outcome, ground));
  }

  @Test
  void proof_comesBeforeObjectiveAndTime() {
    expect(found(55), proved(55, 59), WIN, Ground.PROOF);
    expect(proved(55, 59), found(55), LOSS, Ground.PROOF);
    // A proof of infeasibility has no objective and still beats a run that only searched.
    Attainment infeasible = new Attainment(true, true, OptionalLong.empty(), OptionalDouble.of(3));
    expect(NOTHING, infeasible, WIN, Ground.PROOF);
  }

  @Test
  void anAnswer_beatsNone() {
    expect(NOTHING, found(99), WIN, Ground.ANSWER);
    expect(found(99), NOTHING, LOSS, Ground.ANSWER);
  }

  @Test
  void theBetterObjective_wins_betweenRunsThatHitTheLimit() {
    expect(found(60), found(57), WIN, Ground.OBJECTIVE);
    expect(found(57), found(60), LOSS, Ground.OBJECTIVE);
  }

  @Test
  void equalObjectivesWithoutProof_areOpen_notTied() {
    expect(found(57), found(57), BOTH_OPEN, Ground.NONE);
    expect(NOTHING, NOTHING, BOTH_OPEN, Ground.NONE);
  }

  @Test
  void time_decidesBetweenProofs_beyondTheMargin() {
    expect(proved(55, 10), proved(55, 9.4), WIN, Ground.TIME);
    expect(proved(55, 9.4), proved(55, 10), LOSS, Ground.TIME);
    expect(proved(55, 10), proved(55, 10.5), TIE, Ground.NONE);
    expect(proved(55, 0.02), proved(55, 0.07), TIE, Ground.NONE);
    expect(proved(55, 0.02), proved(55, 0.08), LOSS, Ground.TIME);
  }

  @Test
  void untimedProofs_tie() {
    Attainment untimed = new Attainment(true, true, OptionalLong.of(5), OptionalDouble.empty());
    expect(untimed, untimed, TIE, Ground.NONE);
  }

  /**
   * With no margin the wins of all ordered pairs of the toy table are its Borda scores with step: A
   * 8, B 7, C 3.
   */
  @Test
  void wins_addUpToTheBordaScores_onTheToyTable() {
    PairRule strict = new PairRule(new TieMargin(0, 0));
    List<double[]> candidates = List.of(ToyTable.A, ToyTable.B, ToyTable.C);
    List<Integer> scores = new ArrayList<>();
    for (double[] after : candidates) {
      int wins = 0;
      for (double[] before : candidates) {
        for (int i = 0; i < after.length; i++) {
          Outcome outcome = strict.compare(satisfied(before[i]), satisfied(after[i])).outcome();
          wins += outcome == WIN ? 1 : 0;
        }
      }
      scores.add(wins);
    }

    assertThat(scores).containsExactly(8, 7, 3);
  }

  private static Attainment satisfied(double seconds) {
    return Double.isNaN(seconds)
        ? NOTHING
        : new Attainment(true, true, OptionalLong.empty(), OptionalDouble.of(seconds));
  }

  @Test
  void instance_followsTheMajorityOfItsPairs() {
    assertThat(Outcome.ofInstance(List.of(WIN, WIN, LOSS, TIE))).isEqualTo(WIN);
    assertThat(Outcome.ofInstance(List.of(LOSS, BOTH_OPEN))).isEqualTo(LOSS);
    assertThat(Outcome.ofInstance(List.of(WIN, LOSS, BOTH_OPEN))).isEqualTo(TIE);
    assertThat(Outcome.ofInstance(List.of(TIE, BOTH_OPEN))).isEqualTo(TIE);
    assertThat(Outcome.ofInstance(List.of(UNCHANGED, BOTH_OPEN))).isEqualTo(BOTH_OPEN);
    assertThat(Outcome.ofInstance(Collections.nCopies(3, UNCHANGED))).isEqualTo(UNCHANGED);
  }
}
