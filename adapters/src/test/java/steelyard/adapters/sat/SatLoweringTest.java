package steelyard.adapters.sat;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.View;
import steelyard.variants.model.build.ModelBuilder;

/** What the contract asks of the lowering: limits, endings, counters, refusals. */
class SatLoweringTest {
  private static final Goal SATISFY = new Goal.Satisfy();
  private static final Goal OPTIMISE = new Goal.Optimise();

  @Test
  void givesEqualCounters_whenSolvedTwiceInOneProcess() {
    Model model = Rulers.of(6);
    Solved once = Solved.of(model, OPTIMISE);
    Solved again = Solved.of(model, OPTIMISE);
    assertThat(again.counters).isEqualTo(once.counters);
    assertThat(again.solutions).isEqualTo(once.solutions);
    assertThat(once.counters)
        .containsOnlyKeys("decisions", "failures", "learned-clauses", "propagations", "restarts");
    assertThat(once.counters.get("failures")).isPositive();
  }

  @Test
  void givesOtherCounters_whenSeedIsOther() {
    Seeding seeding = Seeding.of(Rulers.of(6), 7);
    Solved permuted = Solved.of(seeding.model(), seeding.goal(OPTIMISE));
    Solved plain = Solved.of(Rulers.of(6), OPTIMISE);
    assertThat(permuted.outcome).isEqualTo(plain.outcome);
    assertThat(permuted.counters).isNotEqualTo(plain.counters);
  }

  @ParameterizedTest
  @FieldSource("steelyard.adapters.sat.SatBackend#SOLVERS")
  void provesTheSameOptimum_withEverySolver(String solver) {
    Solved solved = Solved.of(Rulers.of(5), OPTIMISE, Map.of(SatBackend.SOLVER, solver));
    assertThat(solved.outcome.status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome.bound()).hasValue(11);
  }

  @Test
  void endsAfterExactlySoManyConflicts_whenWorkIsLimited() {
    Solved solved = Solved.of(pigeons(10, 8), SATISFY, TestDeadline.work("conflicts", 250));
    assertThat(solved.outcome)
        .isEqualTo(SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), SolveOutcome.Why.WORK));
    assertThat(solved.counters).containsEntry("failures", 250L);
  }

  @Test
  void keepsWhatItFound_whenWorkRunsOut() {
    Solved all = Solved.of(Rulers.of(7), OPTIMISE);
    Solved part = Solved.of(Rulers.of(7), OPTIMISE, TestDeadline.work("conflicts", 40));
    assertThat(part.outcome.status()).isEqualTo(Status.FEASIBLE);
    assertThat(part.outcome.ended()).isEqualTo(SolveOutcome.Why.WORK);
    assertThat(part.outcome.bound().getAsLong()).isLessThanOrEqualTo(25);
    assertThat(all.solutions).startsWith(part.solutions.toArray(Ints[]::new));
  }

  @Test
  void searchesNothing_whenStopWasAskedBefore() {
    TestDeadline deadline = TestDeadline.none();
    Lowered lowered = lower(pigeons(4, 4), Map.of(), deadline);
    deadline.stop();
    try (Lowering lowering = (Lowering) lowered) {
      SolveOutcome outcome = lowering.solve(SATISFY, Solved.listener());
      assertThat(outcome)
          .isEqualTo(
              SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), SolveOutcome.Why.STOPPED));
    }
  }

  @Test
  void stopsSearching_whenStopIsAskedMeanwhile() {
    Model model = SmallModels.of(List.of(Domain.between(1, 1000)), List.of());
    TestDeadline deadline = TestDeadline.none();
    Solved solved =
        Solved.of(
            model,
            Solved.all(model),
            Map.of(),
            deadline,
            s -> {
              if (s.solutions.size() == 3) {
                deadline.stop();
              }
            });
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.outcome.ended()).isEqualTo(SolveOutcome.Why.STOPPED);
    assertThat(solved.solutions).hasSize(3);
  }

  @Test
  void stopsEncoding_whenStopIsAskedMeanwhile() {
    Model model = SmallModels.of(List.of(Domain.between(0, 100_000)), List.of());
    for (int looks = 0; looks < 40; looks++) {
      Solved solved = Solved.of(model, SATISFY, TestDeadline.afterLooks(looks));
      assertThat(solved.outcome)
          .isEqualTo(
              SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), SolveOutcome.Why.STOPPED));
    }
  }

  @Test
  void enumeratesNoMoreThanAsked() {
    Model model = SmallModels.of(List.of(Domain.between(1, 9)), List.of());
    Solved solved = Solved.of(model, new Goal.Enumerate(Ints.of(0), 4));
    assertThat(solved.solutions).hasSize(4).doesNotHaveDuplicates();
    assertThat(solved.outcome.ended()).isEqualTo(SolveOutcome.Why.EXHAUSTED);
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
  }

  @Test
  void countsEachProjectedSolutionOnce() {
    Model model = SmallModels.of(List.of(Domain.between(1, 3), Domain.between(0, 9)), List.of());
    Solved solved = Solved.of(model, new Goal.Enumerate(Ints.of(0), Long.MAX_VALUE));
    assertThat(solved.solutions).extracting(s -> s.get(0)).containsExactlyInAnyOrder(1, 2, 3);
  }

  /** The library leaves variables that occur in no clause out of its models. */
  @Test
  void givesValuesToVariables_thatOccurNowhere() {
    Model model =
        SmallModels.of(List.of(Domain.BOOLEAN, Domain.of(4, 6, 9), Domain.of(-3)), List.of());
    Solved solved = Solved.of(model, Solved.all(model));
    assertThat(solved.solutions)
        .containsExactlyInAnyOrder(
            Ints.of(0, 4, -3),
            Ints.of(0, 6, -3),
            Ints.of(0, 9, -3),
            Ints.of(1, 4, -3),
            Ints.of(1, 6, -3),
            Ints.of(1, 9, -3));
  }

  /** The library forgets a contradiction that it met while clauses were added. */
  @Test
  void staysInfeasible_whenAClauseIsEmpty() {
    Model model =
        SmallModels.of(
            List.of(Domain.BOOLEAN), List.of(new Clause(Atoms.of()), new Clause(Atoms.of())));
    assertThat(Solved.of(model, SATISFY).outcome)
        .isEqualTo(
            SolveOutcome.of(Status.INFEASIBLE, OptionalLong.empty(), SolveOutcome.Why.EXHAUSTED));
  }

  @Test
  void provesAConstantObjective() {
    Objective constant =
        new Objective(Objective.Sense.MAXIMIZE, new LinearSum(Ints.of(0), Longs.of(3), 5));
    Model model = SmallModels.of(List.of(Domain.of(2)), List.of(), Optional.of(constant));
    Solved solved = Solved.of(model, OPTIMISE);
    assertThat(solved.outcome.status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome.bound()).hasValue(11);
  }

  @Test
  void satisfies_whenThereIsNoObjectiveToOptimise() {
    Solved solved = Solved.of(pigeons(3, 3), OPTIMISE);
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.solutions).hasSize(1);
  }

  @Test
  void refusesToEnumerate_overWhatNothingUses() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", Domain.between(0, 3));
              draft.define("twice", x.times(2));
            });
    int twice = model.variables().find("twice").getAsInt();
    SolveOutcome outcome = Solved.of(model, new Goal.Enumerate(Ints.of(twice), 9)).outcome;
    assertThat(outcome.ended()).isEqualTo(SolveOutcome.Why.REFUSED);
    assertThat(outcome.reason()).contains("twice");
  }

  @Test
  void refusesByNumbers_whenADomainIsHuge() {
    Model model = SmallModels.of(List.of(Domain.between(0, Domain.LIMIT)), List.of());
    Lowered lowered = lower(model, Map.of(), TestDeadline.none());
    assertThat(lowered)
        .isEqualTo(
            new Refusal(
                "sat would need more than 10000000 variables (max-variables): 0 variables, 0"
                    + " clauses up to variable x0 of 1000000001 values"));
  }

  @Test
  void refusesByNumbers_whenClausesAreTooMany() {
    Lowered lowered =
        lower(pigeons(8, 9), Map.of(EncodingSettings.MOST_CLAUSES, "200"), TestDeadline.none());
    assertThat(lowered)
        .isInstanceOfSatisfying(
            Refusal.class,
            refusal ->
                assertThat(refusal.reason())
                    .contains("more than 200 clauses (max-clauses)", "asserted[0]"));
  }

  @Test
  void refusesOtherUnitsOfWork() {
    Lowered lowered = lower(pigeons(2, 2), Map.of(), TestDeadline.work("nodes", 5));
    assertThat(lowered).isEqualTo(new Refusal("sat counts work in conflicts, not in nodes"));
  }

  @Test
  void refusesMoreThanOneThread() {
    SolveRequest one = Solved.request(Map.of(), TestDeadline.none());
    SolveRequest two = new SolveRequest(one.settings(), 0, 2, one.deadline());
    assertThat(Solved.BACKEND.lower(pigeons(2, 2), two, Solved.listener()))
        .isEqualTo(new Refusal("sat runs one thread, not 2"));
  }

  @Test
  void failsLoudly_whenSolvedASecondTime() {
    try (Lowering lowering = (Lowering) lower(pigeons(2, 2), Map.of(), TestDeadline.none())) {
      lowering.solve(SATISFY, Solved.listener());
      assertThatThrownBy(() -> lowering.solve(SATISFY, Solved.listener()))
          .isInstanceOf(IllegalStateException.class);
    }
  }

  @Test
  void tellsSizesByPostingAndHow() {
    try (Lowering lowering = (Lowering) lower(pigeons(4, 4), Map.of(), TestDeadline.none())) {
      assertThat(lowering.sizes().unit()).isEqualTo("clauses");
      assertThat(lowering.sizes().how()).containsOnlyKeys("all-different");
      assertThat(lowering.sizes().byPosting().get(0)).isPositive();
      assertThat(lowering.facet(Printable.class)).isPresent();
    }
  }

  /** All different: pigeons in holes, the first with spare room, which hides what is missing. */
  private static Model pigeons(int pigeons, int holes) {
    List<Domain> domains = new ArrayList<>();
    domains.add(Domain.between(1, holes + 3));
    IntStream.range(1, pigeons).forEach(p -> domains.add(Domain.between(1, holes)));
    View[] scope = IntStream.range(0, pigeons).mapToObj(View::of).toArray(View[]::new);
    return SmallModels.of(domains, List.of(AllDifferent.of(scope)));
  }

  private static Lowered lower(Model model, Map<String, String> settings, TestDeadline deadline) {
    return Solved.BACKEND.lower(model, Solved.request(settings, deadline), Solved.listener());
  }
}
