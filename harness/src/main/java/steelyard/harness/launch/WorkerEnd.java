package steelyard.harness.launch;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import steelyard.harness.process.Exit;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.StampedEvent;

/**
 * What came of a worker.
 *
 * @param startNanos {@link System#nanoTime} when it was started
 * @param events all that it said
 * @param forged how many lines in its events were not its own
 */
public record WorkerEnd(long startNanos, Exit exit, List<StampedEvent> events, long forged) {
  public WorkerEnd {
    events = List.copyOf(events);
  }

  /** The events of one kind, in order. */
  public <E extends Event> Stream<E> all(Class<E> kind) {
    return events.stream().map(StampedEvent::event).filter(kind::isInstance).map(kind::cast);
  }

  /** The last event of one kind. */
  public <E extends Event> Optional<E> last(Class<E> kind) {
    return all(kind).reduce((first, second) -> second);
  }

  /**
   * Insists that the worker did its task.
   *
   * @throws HarnessProblem with what it said of its failure, or how it ended
   */
  public WorkerEnd orThrow(String what) {
    Optional<Event.Failure> failure = last(Event.Failure.class);
    if (failure.isPresent()) {
      throw new HarnessProblem(failure.get().message());
    }
    if (!exit.clean()) {
      throw new HarnessProblem(what + " failed: " + howItEnded());
    }
    return this;
  }

  /** How the process ended, in one line. */
  public String howItEnded() {
    if (exit.reason().isPresent()) {
      return switch (exit.reason().get()) {
        case WALL -> "it was still running at its limit";
        case MEMORY -> "it held more memory than allowed";
        case PHASE ->
            exit.phase().startsWith(Phases.BUILD)
                ? "reading the instance or building the model took longer than allowed"
                : "it took too long in phase '" + exit.phase() + "'";
        case STOPPED -> "it was stopped";
      };
    }
    String said =
        exit.stderr().lines().filter(line -> !line.isBlank()).reduce((a, b) -> b).orElse("");
    String code = exit.code().isPresent() ? "exit code " + exit.code().getAsInt() : "no exit code";
    return code + (said.isEmpty() ? "" : ": " + said.strip());
  }
}
