package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Map;
import org.junit.jupiter.api.Test;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Model;

/** What ends a solve that has no answer yet. */
class LimitsTest {
  private static final Model HARD = JobShop.model(JobShop.FT10);

  @Test
  void endsByWork_whenDeterministicSecondsAreUsedUp() {
    Solved solved = solve(Limit.work(WorkUnits.DETERMINISTIC_SECONDS, 0.02));
    assertThat(solved.outcome().ended()).isEqualTo(Why.WORK);
    assertThat(solved.outcome().status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.heard().counters.get("deterministic-microseconds"))
        .isBetween(20_000L, 40_000L);
  }

  @Test
  void endsByWork_whenConflictsAreUsedUp() {
    Solved solved = solve(Limit.work(WorkUnits.CONFLICTS, 50));
    assertThat(solved.outcome().ended()).isEqualTo(Why.WORK);
    assertThat(solved.heard().counters.get("failures")).isGreaterThanOrEqualTo(50);
  }

  @Test
  void knowsNothing_whenWorkEndsBeforeTheSearch() {
    Solved solved = solve(Limit.work(WorkUnits.DETERMINISTIC_SECONDS, 1e-9));
    assertThat(solved.outcome())
        .isEqualTo(SolveOutcome.of(Status.UNKNOWN, solved.outcome().bound(), Why.WORK));
    assertThat(solved.outcome().bound()).isEmpty();
    assertThat(solved.heard().solutions).isEmpty();
  }

  @Test
  void endsByTheWallLimit() {
    assertThat(solve(Limit.wallSeconds(0.4)).outcome().ended()).isEqualTo(Why.WALL);
  }

  @Test
  void returnsAtOnce_whenTheWallLimitHasPassed() {
    Solved solved = solve(Limit.wallSeconds(0));
    assertThat(solved.outcome().ended()).isEqualTo(Why.WALL);
    assertThat(solved.outcome().status()).isEqualTo(Status.UNKNOWN);
  }

  @Test
  void returnsAtOnce_whenStoppedBefore() {
    Limit limit = Limit.none();
    limit.stop();
    assertThat(solve(limit).outcome().ended()).isEqualTo(Why.STOPPED);
  }

  @Test
  void stops_whenAskedDuringTheSearch() {
    Limit limit = Limit.none();
    assertThat(stoppedAt("search", limit).outcome().ended()).isEqualTo(Why.STOPPED);
  }

  @Test
  void stops_whenAskedDuringPresolve() {
    Limit limit = Limit.none();
    Solved solved = stoppedAt("presolve", limit);
    assertThat(solved.outcome().ended()).isEqualTo(Why.STOPPED);
    assertThat(solved.outcome().bound()).isEmpty();
  }

  @Test
  void ignoresAStop_thatComesAfter() {
    Limit limit = Limit.none();
    Solved solved =
        Solving.solve(JobShop.model(JobShop.FT06), new Goal.Optimise(), Map.of(), limit);
    limit.stop();
    assertThat(solved.outcome().status()).isEqualTo(Status.OPTIMAL);
  }

  @Test
  void repeatsItself_whenLimitedByWorkInOneProcess() {
    Solved first = solve(Limit.work(WorkUnits.DETERMINISTIC_SECONDS, 0.05));
    Solved second = solve(Limit.work(WorkUnits.DETERMINISTIC_SECONDS, 0.05));
    assertThat(second.heard().counters).isEqualTo(first.heard().counters);
    assertThat(second.heard().solutions).isEqualTo(first.heard().solutions);
    assertThat(second.heard().bounds).isEqualTo(first.heard().bounds);
    assertThat(second.outcome()).isEqualTo(first.outcome());
  }

  @Test
  void findsTheOptimum_withTwoThreads() {
    Solved solved =
        Solving.solve(
            JobShop.model(JobShop.FT06),
            new Goal.Optimise(),
            Solving.request(Map.of(), 2, Limit.none()));
    assertThat(solved.outcome().bound()).hasValue(55);
    assertThat(solved.heard().counters).containsOnlyKeys("deterministic-microseconds");
  }

  @Test
  void rethrows_whatAMonitorThrows() {
    Recording broken =
        new Recording(
            phase -> {},
            () -> {
              throw new IllegalStateException("no room for solutions");
            });
    assertThatThrownBy(() -> solve(Limit.none(), broken))
        .isInstanceOf(IllegalStateException.class)
        .hasMessage("no room for solutions");
  }

  @Test
  void rethrows_whatAMonitorThrowsAtAPhase() {
    Recording broken =
        new Recording(
            phase -> {
              if (phase.equals("search")) {
                throw new IllegalArgumentException("no such phase");
              }
            },
            () -> {});
    assertThatThrownBy(() -> solve(Limit.none(), broken))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void refusesToSolveTwice() {
    SolveRequest request = Solving.request(Map.of(), 1, Limit.none());
    Recording heard = new Recording();
    try (Lowering once =
        (Lowering) Solving.BACKEND.lower(JobShop.model(JobShop.FT06), request, heard)) {
      once.solve(new Goal.Satisfy(), heard);
      assertThatThrownBy(() -> once.solve(new Goal.Satisfy(), heard))
          .isInstanceOf(IllegalStateException.class);
    }
  }

  private static Solved stoppedAt(String phase, Limit limit) {
    Recording stopping =
        new Recording(
            name -> {
              if (name.equals(phase)) {
                limit.stop();
              }
            },
            () -> {});
    return solve(limit, stopping);
  }

  private static Solved solve(Limit limit) {
    return solve(limit, new Recording());
  }

  private static Solved solve(Limit limit, Recording heard) {
    SolveRequest request = Solving.request(Map.of(), 1, limit);
    return Solving.solve(HARD, new Goal.Optimise(), request, heard);
  }
}
