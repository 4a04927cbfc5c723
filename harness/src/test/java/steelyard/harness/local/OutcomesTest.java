package steelyard.harness.local;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.process.Exit;
import steelyard.harness.process.Usage;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.StampedEvent;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Outcome;
import steelyard.variants.model.Ints;

/** What a run is recorded as, from what its worker said and how its process ended. */
class OutcomesTest {
  private static final long LIMIT_SECONDS = 3;
  private static final long SECOND = 1_000_000_000L;

  private final List<StampedEvent> events = new ArrayList<>();

  private OutcomesTest at(double seconds, Event event) {
    events.add(new StampedEvent(events.size(), (long) (seconds * SECOND), event));
    return this;
  }

  /** A run whose limit's clock starts at second 1. */
  private OutcomesTest lowered() {
    return at(1, new Event.Phase(Phases.LOWER, OptionalLong.empty()));
  }

  private OutcomesTest solution(double seconds, long objective) {
    return at(seconds, new Event.Solution(OptionalLong.of(objective), Ints.of(0)));
  }

  private OutcomesTest result(double seconds, Status status, SolveOutcome.Why why) {
    return at(seconds, new Event.Result(new SolveOutcome(status, OptionalLong.of(7), why, "")));
  }

  private Outcome outcome(int code, Optional<Exit.Reason> reason, boolean killed) {
    Exit exit =
        new Exit(
            OptionalInt.of(code),
            reason,
            killed,
            Phases.SOLVE,
            5 * SECOND,
            LIMIT_SECONDS * SECOND,
            0,
            new Usage(0, 1, Usage.MemorySource.NONE, 1, 0),
            0,
            0,
            List.of(),
            "");
    WorkerEnd end = new WorkerEnd(0, exit, events, 0);
    return Outcomes.of(end, new RunReading(end), LIMIT_SECONDS);
  }

  /** The harness asks at the limit, and a solver cannot tell that from being asked by a person. */
  @ParameterizedTest
  @CsvSource({"WALL, TIME_LIMIT", "STOPPED, STOPPED"})
  void a_solver_that_was_asked_to_stop_ended_for_the_reason_of_who_asked(
      Exit.Reason reason, Ending ending) {
    Outcome inTime =
        lowered()
            .solution(2, 9)
            .result(3.9, Status.FEASIBLE, SolveOutcome.Why.STOPPED)
            .outcome(0, Optional.of(reason), false);
    assertThat(inTime.ending()).isEqualTo(ending);

    events.clear();
    Outcome late =
        lowered()
            .solution(2, 9)
            .result(4.1, Status.FEASIBLE, SolveOutcome.Why.STOPPED)
            .outcome(0, Optional.of(reason), false);
    assertThat(late.ending()).isEqualTo(ending);
    assertThat(late.objective()).hasValue(9);
  }

  @Test
  void a_claim_after_the_limit_does_not_count() {
    Outcome outcome =
        lowered()
            .solution(2, 9)
            .solution(4.2, 7)
            .result(4.2, Status.OPTIMAL, SolveOutcome.Why.EXHAUSTED)
            .outcome(0, Optional.empty(), false);
    assertThat(outcome.status()).isEqualTo(steelyard.results.ledger.Status.FEASIBLE);
    assertThat(outcome.ending()).isEqualTo(Ending.TIME_LIMIT);
    assertThat(outcome.objective()).hasValue(9);
    assertThat(outcome.bound()).isEmpty();
  }

  @Test
  void an_optimum_without_a_solution_is_no_optimum() {
    Outcome outcome =
        lowered()
            .result(2, Status.OPTIMAL, SolveOutcome.Why.EXHAUSTED)
            .outcome(0, Optional.empty(), false);
    assertThat(outcome.status()).isEqualTo(steelyard.results.ledger.Status.UNKNOWN);
    assertThat(outcome.ending()).isEqualTo(Ending.CRASHED);
    assertThat(outcome.reason()).hasValue("claims an optimum without a solution that has one");
  }

  @Test
  void a_full_heap_is_the_memory_limit_andAKillFromOutsideIsACrash() {
    assertThat(lowered().outcome(3, Optional.empty(), false).ending())
        .isEqualTo(Ending.MEMORY_LIMIT);
    assertThat(outcome(0, Optional.of(Exit.Reason.MEMORY), true).ending())
        .isEqualTo(Ending.MEMORY_LIMIT);
    Outcome killed = outcome(128 + 9, Optional.empty(), false);
    assertThat(killed.ending()).isEqualTo(Ending.CRASHED);
    assertThat(killed.reason().orElseThrow()).contains("killed from outside");
  }
}
