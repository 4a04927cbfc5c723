package steelyard.harness.local;

import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.process.Exit;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.StampedEvent;
import steelyard.results.ledger.Ending;
import steelyard.results.ledger.Outcome;
import steelyard.results.ledger.Status;

/**
 * What a run established and how it ended, from what its worker said in time and how its processes
 * ended. A solution counts whoever ended the run; a claim counts only if it came before the limit.
 */
final class Outcomes {
  /** {@code -XX:+ExitOnOutOfMemoryError} ends the JVM with it. */
  private static final int OUT_OF_HEAP = 3;

  private static final int KILLED = 9;

  private final WorkerEnd end;
  private final RunReading reading;
  private final long limitNanos;

  private Outcomes(WorkerEnd end, RunReading reading, long limitNanos) {
    this.end = end;
    this.reading = reading;
    this.limitNanos = limitNanos;
  }

  static Outcome of(WorkerEnd end, RunReading reading, double wallSeconds) {
    return new Outcomes(end, reading, (long) (wallSeconds * 1e9)).outcome();
  }

  private record Ended(Ending ending, String reason) {}

  private Outcome outcome() {
    boolean minimize =
        end.last(Event.Built.class).map(built -> built.facts().minimize()).orElse(true);
    List<StampedEvent> solutions = reading.solutions(limitNanos);
    Optional<SolveOutcome> claim =
        reading
            .first(Event.Result.class)
            .filter(stamped -> reading.inTime(stamped, limitNanos))
            .map(stamped -> ((Event.Result) stamped.event()).outcome());
    Ended ended = ended(claim);
    OptionalLong objective = best(solutions, minimize);
    Status status = status(claim, !solutions.isEmpty());
    boolean hollow = status == Status.OPTIMAL && (solutions.isEmpty() || objective.isEmpty());
    if (hollow) {
      ended = new Ended(Ending.CRASHED, "claims an optimum without a solution that has one");
      status = solutions.isEmpty() ? Status.UNKNOWN : Status.FEASIBLE;
    }
    boolean solved = status == Status.OPTIMAL || status == Status.FEASIBLE;
    return new Outcome(
        status,
        ended.ending(),
        claim.map(it -> it.ended().name()),
        end.exit().killed() ? end.exit().reason().map(Enum::name) : Optional.empty(),
        ended.reason().isEmpty() ? Optional.empty() : Optional.of(ended.reason()),
        minimize,
        solved ? objective : OptionalLong.empty(),
        claim.map(SolveOutcome::bound).orElse(lastBound()));
  }

  private static Status status(Optional<SolveOutcome> claim, boolean hasSolution) {
    Status said = claim.map(it -> Status.valueOf(it.status().name())).orElse(Status.UNKNOWN);
    if (said == Status.UNKNOWN) {
      return hasSolution ? Status.FEASIBLE : Status.UNKNOWN;
    }
    // A feasible run without a solution says nothing that could be checked.
    return said == Status.FEASIBLE && !hasSolution ? Status.UNKNOWN : said;
  }

  private OptionalLong lastBound() {
    return end.events().stream()
        .filter(s -> s.event() instanceof Event.Bound && reading.inTime(s, limitNanos))
        .mapToLong(s -> ((Event.Bound) s.event()).value())
        .reduce((first, second) -> second);
  }

  private static OptionalLong best(List<StampedEvent> solutions, boolean minimize) {
    return solutions.stream()
        .map(s -> ((Event.Solution) s.event()).objective())
        .filter(OptionalLong::isPresent)
        .mapToLong(OptionalLong::getAsLong)
        .reduce((a, b) -> minimize ? Math.min(a, b) : Math.max(a, b));
  }

  private Ended ended(Optional<SolveOutcome> claim) {
    Optional<Event.Failure> failure = end.last(Event.Failure.class);
    if (failure.isPresent()) {
      return failed(failure.get());
    }
    if (claim.isPresent()) {
      return new Ended(ending(claim.get().ended()), claim.get().reason());
    }
    Optional<SolveOutcome> late = end.last(Event.Result.class).map(Event.Result::outcome);
    if (late.isPresent() && late.get().ended() != SolveOutcome.Why.EXHAUSTED) {
      return new Ended(ending(late.get().ended()), late.get().reason());
    }
    if (late.isPresent()) {
      return new Ended(Ending.TIME_LIMIT, "answered after the limit");
    }
    return end.exit().reason().map(this::cut).orElseGet(this::died);
  }

  private static Ended failed(Event.Failure failure) {
    Ending ending =
        failure.kind() == Event.Failure.Kind.UNSUPPORTED ? Ending.UNSUPPORTED : Ending.CRASHED;
    return new Ended(ending, failure.message());
  }

  private Ending ending(SolveOutcome.Why why) {
    return switch (why) {
      case EXHAUSTED -> Ending.COMPLETED;
      case WALL -> Ending.TIME_LIMIT;
      case WORK -> Ending.WORK_LIMIT;
      // A solver knows only that it was asked to stop; who asked, and why, the harness knows.
      case STOPPED ->
          end.exit().reason().equals(Optional.of(Exit.Reason.WALL))
              ? Ending.TIME_LIMIT
              : Ending.STOPPED;
      case REFUSED -> Ending.UNSUPPORTED;
      case FAILED -> Ending.CRASHED;
    };
  }

  private Ended cut(Exit.Reason reason) {
    return switch (reason) {
      case WALL -> new Ended(Ending.TIME_LIMIT, "");
      case MEMORY -> new Ended(Ending.MEMORY_LIMIT, "");
      case STOPPED -> new Ended(Ending.STOPPED, "");
      case PHASE -> new Ended(Ending.CRASHED, end.howItEnded());
    };
  }

  private Ended died() {
    int code = end.exit().code().orElse(-1);
    int signal = end.exit().signal().orElse(0);
    if (code == OUT_OF_HEAP) {
      return new Ended(Ending.MEMORY_LIMIT, "the Java heap was full");
    }
    if (signal == KILLED) {
      return new Ended(Ending.CRASHED, "killed from outside, as when the machine's memory is full");
    }
    return new Ended(
        Ending.CRASHED,
        "ended without an answer in phase '" + reading.lastPhase() + "': " + end.howItEnded());
  }
}
