package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.build.ModelBuilder;

/** Enumerating counts each solution once, as seen on the projection. */
class EnumerationTest {
  private static final Ints FIRST = Ints.of(0);

  @Test
  void countsOnTheProjection_whenOtherVariablesAreFree() {
    Model model = free(Domain.of(2, 5, 9), Domain.between(0, 6));
    assertThat(seenOnFirst(solve(model, FIRST, 100))).containsExactlyInAnyOrder(2, 5, 9);
  }

  /** Ten billion solutions look like three. */
  @Test
  void ends_whenTheOtherVariablesCouldBeWalkedForEver() {
    Domain digit = Domain.between(0, 9);
    Domain[] domains = IntStream.range(0, 11).mapToObj(v -> digit).toArray(Domain[]::new);
    domains[0] = Domain.of(2, 5, 9);
    Solved solved = solve(free(domains), FIRST, 100);
    assertThat(solved.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(seenOnFirst(solved)).containsExactlyInAnyOrder(2, 5, 9);
  }

  @Test
  void findsOne_whenTheProjectionIsEmpty() {
    Solved solved = solve(free(Domain.between(0, 9), Domain.between(0, 9)), Ints.of(), 100);
    assertThat(solved.heard().solutions).hasSize(1);
    assertThat(solved.outcome().ended()).isEqualTo(Why.EXHAUSTED);
  }

  @Test
  void stops_whenThereAreEnough() {
    Solved solved = solve(free(Domain.between(0, 99), Domain.between(0, 99)), Ints.of(0, 1), 7);
    assertThat(solved.heard().solutions).hasSize(7).doesNotHaveDuplicates();
    assertThat(solved.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(solved.outcome().status()).isEqualTo(Status.FEASIBLE);
  }

  @Test
  void saysInfeasible_whenThereIsNone() {
    Linear never = new Linear(new LinearSum(Ints.of(0), Longs.of(2), 0), Comparison.EQ, 3);
    Model model = Solving.flat(List.of(Domain.between(0, 5)), List.of(never), Optional.empty());
    assertThat(solve(model, FIRST, 9).outcome().status()).isEqualTo(Status.INFEASIBLE);
  }

  @Test
  void saysSo_whenAStopCutsItShort() {
    Limit limit = Limit.none();
    Recording stopping = new Recording(phase -> {}, limit::stop);
    Solved solved =
        Solving.solve(
            free(Domain.between(0, 999), Domain.between(0, 999)),
            new Goal.Enumerate(Ints.of(0, 1), Long.MAX_VALUE),
            Solving.request(Map.of(), 1, limit),
            stopping);
    assertThat(solved.outcome().ended()).isEqualTo(Why.STOPPED);
    assertThat(solved.outcome().status()).isEqualTo(Status.FEASIBLE);
  }

  @Test
  void saysSo_whenWorkEndsIt() {
    Solved solved =
        Solving.solve(
            free(Domain.between(0, 999), Domain.between(0, 999)),
            new Goal.Enumerate(Ints.of(0, 1), Long.MAX_VALUE),
            Map.of(),
            Limit.work(WorkUnits.DETERMINISTIC_SECONDS, 1e-4));
    assertThat(solved.outcome().ended()).isEqualTo(Why.WORK);
  }

  /** A threaded library loses solutions, so one thread enumerates whatever is asked. */
  @Test
  void findsAll_whenAskedForThreads() {
    Model model = free(Domain.between(0, 3), Domain.between(0, 5));
    Goal all = new Goal.Enumerate(Ints.of(0, 1), Long.MAX_VALUE);
    Solved solved = Solving.solve(model, all, Solving.request(Map.of(), 2, Limit.none()));
    assertThat(solved.heard().solutions).hasSize(24).doesNotHaveDuplicates();
  }

  /** A definition that nothing uses is not lowered. */
  @Test
  void refuses_whenNothingSaysWhatAProjectedVariableIs() {
    Model model =
        ModelBuilder.of(
            draft -> {
              IntVar x = draft.integer("x", 0, 3);
              draft.define("twice", x.times(2));
            });
    Solved solved = solve(model, Ints.of(1), 9);
    assertThat(solved.outcome().ended()).isEqualTo(Why.REFUSED);
    assertThat(solved.outcome().reason()).contains("twice");
  }

  private static Model free(Domain... domains) {
    return Solving.flat(List.of(domains), List.of(), Optional.empty());
  }

  private static Solved solve(Model model, Ints projection, long atMost) {
    return Solving.solve(model, new Goal.Enumerate(projection, atMost));
  }

  private static List<Integer> seenOnFirst(Solved solved) {
    return solved.heard().solutions.stream().map(s -> s.get(0)).toList();
  }
}
