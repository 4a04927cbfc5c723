package steelyard.adapters.engine;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import steelyard.adapters.puzzles.Pigeonholes;
import steelyard.adapters.puzzles.Queens;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Branching;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Hint;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Model;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

class EngineBackendTest {
  private static final Solved.Looks NO_LIMIT = new Solved.Looks(Long.MAX_VALUE, Optional.empty());
  private static final Map<String, String> NO_RESTARTS =
      Map.of(EngineBackend.RESTARTS, EngineBackend.NEVER);

  /** n pigeons for one hole too few, each pair apart: there is much to fail on. */
  private static Model crowded() {
    return Pigeonholes.byPairs(8, 7);
  }

  @Test
  void endsAfterExactlyTheFailuresAllowed() {
    Solved solved =
        Solved.of(
            crowded(),
            new Goal.Satisfy(),
            Map.of(),
            Solved.Looks.work(EngineBackend.FAILURES, 123));
    assertThat(solved.outcome.ended()).isEqualTo(Why.WORK);
    assertThat(solved.outcome.status()).isEqualTo(Status.UNKNOWN);
    assertThat(solved.counters).containsEntry("failures", 123L);
  }

  @Test
  void endsAfterExactlyTheDecisionsAllowed() {
    Solved solved =
        Solved.of(
            crowded(),
            new Goal.Satisfy(),
            Map.of(),
            Solved.Looks.work(EngineBackend.DECISIONS, 77));
    assertThat(solved.outcome.ended()).isEqualTo(Why.WORK);
    assertThat(solved.counters).containsEntry("decisions", 77L);
  }

  @Test
  void refusesUnitsOfWorkThatItDoesNotCount() {
    SolveRequest request =
        Solved.request(Map.of(), 0, Solved.Looks.work("deterministic-seconds", 5));
    assertThat(Solved.BACKEND.lower(crowded(), request, Solved.of(crowded(), new Goal.Satisfy())))
        .isInstanceOfSatisfying(
            Refusal.class, r -> assertThat(r.reason()).contains("deterministic-seconds"));
  }

  @Test
  void refusesMoreThanOneThread() {
    Settings settings = Settings.of(Solved.BACKEND.describe(), Map.of());
    SolveRequest request = new SolveRequest(settings, 0, 2, NO_LIMIT);
    assertThat(Solved.BACKEND.lower(crowded(), request, Solved.of(crowded(), new Goal.Satisfy())))
        .isInstanceOfSatisfying(Refusal.class, r -> assertThat(r.reason()).contains("thread"));
  }

  @Test
  void refusesViewsBeyondWhatAnIntCanHold_namingThePosting() {
    View far = View.of(0).shifted(900_000_000);
    Model model =
        SmallModels.of(
            List.of(Domain.between(0, 200_000_000), Domain.BOOLEAN),
            List.of(new Maximum(Views.of(far), View.of(1))));
    SolveRequest request = Solved.request(Map.of(), 0, NO_LIMIT);
    assertThat(Solved.BACKEND.lower(model, request, Solved.of(crowded(), new Goal.Satisfy())))
        .isInstanceOfSatisfying(
            Refusal.class, r -> assertThat(r.reason()).contains("asserted").contains("1100000000"));
  }

  @Test
  void stopsWhenAsked_whetherBeforeOrDuringTheSearch() {
    for (long looks : new long[] {0, 1, 40, 60}) {
      Solved solved =
          Solved.of(
              crowded(),
              new Goal.Satisfy(),
              NO_RESTARTS,
              new Solved.Looks(looks, Optional.empty()));
      assertThat(solved.outcome.ended()).as("after %d looks", looks).isEqualTo(Why.STOPPED);
      assertThat(solved.outcome.status()).isEqualTo(Status.UNKNOWN);
    }
  }

  @Test
  void isSolvedOnce() {
    SolveRequest request = Solved.request(Map.of(), 0, NO_LIMIT);
    Solved ear = Solved.of(Queens.on(4), new Goal.Satisfy());
    try (Lowering lowering = (Lowering) Solved.BACKEND.lower(Queens.on(4), request, ear)) {
      lowering.solve(new Goal.Satisfy(), ear);
      assertThatThrownBy(() -> lowering.solve(new Goal.Satisfy(), ear))
          .isInstanceOf(IllegalStateException.class);
    }
  }

  @Test
  void countsTheSameInEveryRun() {
    Solved first = Solved.of(crowded(), new Goal.Satisfy());
    Solved second = Solved.of(crowded(), new Goal.Satisfy());
    assertThat(first.outcome.status()).isEqualTo(Status.INFEASIBLE);
    assertThat(first.counters).isEqualTo(second.counters).containsKey("restarts");
    assertThat(first.blame).isEqualTo(second.blame);
  }

  @Test
  void blamesPostings_forEveryFailureButTheDecisionsOwn() {
    Solved solved = Solved.of(crowded(), new Goal.Satisfy());
    assertThat(solved.blame).containsOnlyKeys("failures", "propagations");
    long blamed = solved.blame.get("failures").stream().sum();
    assertThat(blamed).isPositive().isLessThanOrEqualTo(solved.counters.get("failures"));
    assertThat(solved.blame.get("propagations").stream().sum())
        .isLessThanOrEqualTo(solved.counters.get("propagations"));
  }

  @Test
  void countsConstraintsByPosting() {
    Solved solved = Solved.of(Queens.on(5), new Goal.Satisfy());
    assertThat(solved.sizes.unit()).isEqualTo("constraints");
    assertThat(solved.sizes.byPosting().stream().sum())
        .isEqualTo(solved.sizes.totals().get("constraints"));
    assertThat(solved.sizes.how()).containsEntry("all-different", "native");
  }

  private static Model branched(Branching branching, Hint hint) {
    Model plain =
        SmallModels.of(
            List.of(Domain.between(0, 4), Domain.between(0, 4), Domain.between(0, 4)),
            List.of(new AllDifferent(Views.ofVariables(0, 1, 2))));
    return Model.of(plain.variables(), plain.postings(), Optional.empty(), branching, hint);
  }

  @Test
  void followsTheBranching() {
    Branching branching =
        new Branching(
            List.of(
                new Branching.Phase(
                    Views.ofVariables(2, 1),
                    Branching.VariableOrder.INPUT,
                    Branching.ValueOrder.MAX),
                new Branching.Phase(
                    Views.of(View.of(0).negated()),
                    Branching.VariableOrder.INPUT,
                    Branching.ValueOrder.MAX)));
    Solved solved = Solved.of(branched(branching, Hint.NONE), new Goal.Satisfy());
    assertThat(solved.solutions).containsExactly(Ints.of(0, 3, 4));
    Solved own =
        Solved.of(
            branched(branching, Hint.NONE),
            new Goal.Satisfy(),
            Map.of(EngineBackend.BRANCHING, EngineBackend.AUTOMATIC));
    assertThat(own.solutions).containsExactly(Ints.of(0, 1, 2));
  }

  @Test
  void triesTheHintFirst() {
    Hint hint = new Hint(Ints.of(0, 2), Ints.of(3, 1));
    Solved solved = Solved.of(branched(Branching.NONE, hint), new Goal.Satisfy());
    assertThat(solved.solutions).containsExactly(Ints.of(3, 0, 1));
  }

  @Test
  void takesDomainsWithGapsOfAnyWidth() {
    int[] ranges = {-1_000_000_000, -999_999_999, 5, 6, 1_000_000_000, 1_000_000_000};
    List<Domain> domains = List.of(Domain.ofRanges(ranges), Domain.of(0, 7, 9, 4000));
    LinearSum sum = new LinearSum(Ints.of(0, 1), Longs.of(new long[] {1, -1}), 0);
    Model model = SmallModels.of(domains, List.of(Linear.of(sum, Comparison.LE, -3)));
    Solved solved = Solved.of(model, Solved.all(model));
    List<Ints> expected = new ArrayList<>();
    domains.get(0).stream()
        .forEach(
            x ->
                domains.get(1).stream()
                    .filter(y -> x - y <= -3)
                    .forEach(y -> expected.add(Ints.of(x, y))));
    assertThat(solved.solutions).containsExactlyInAnyOrderElementsOf(expected);
  }

  @Test
  void stopsEnumeratingAtTheNumberAskedFor() {
    Model model = Queens.on(6);
    Goal three = new Goal.Enumerate(model.variables().decisions(), 3);
    Solved solved = Solved.of(model, three);
    assertThat(solved.solutions).hasSize(3).doesNotHaveDuplicates();
    assertThat(solved.outcome.ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
  }

  @Test
  void agreesOnQueens_whateverTheSettings() {
    for (String restarts :
        List.of(
            EngineBackend.AUTOMATIC,
            EngineBackend.NEVER,
            EngineBackend.LUBY,
            EngineBackend.GEOMETRIC)) {
      Map<String, String> settings =
          Map.of(
              EngineBackend.RESTARTS,
              restarts,
              EngineBackend.SCALE,
              "1",
              EngineBackend.ALL_DIFFERENT,
              EngineBackend.DOMAIN);
      Model model = Queens.on(6);
      assertThat(Solved.of(model, Solved.all(model), settings).solutions).hasSize(4);
      List<Status> known =
          IntStream.rangeClosed(1, 6)
              .mapToObj(n -> Solved.of(Queens.on(n), new Goal.Satisfy(), settings).outcome.status())
              .toList();
      assertThat(known)
          .containsExactly(
              Status.FEASIBLE,
              Status.INFEASIBLE,
              Status.INFEASIBLE,
              Status.FEASIBLE,
              Status.FEASIBLE,
              Status.FEASIBLE);
    }
  }
}
