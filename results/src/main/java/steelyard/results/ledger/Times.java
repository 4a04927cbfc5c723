package steelyard.results.ledger;

import java.util.Map;
import java.util.OptionalLong;
import java.util.SortedMap;

/**
 * How long a run took, phase by phase.
 *
 * @param phases the phases that were entered; one that was cut off has what it had by then
 * @param overshootNanos how long the process went on after its limit; 0 where it did not
 */
public record Times(SortedMap<Phase, Span> phases, long overshootNanos) {

  /** A phase of a run, in order. */
  public enum Phase {
    /** The process starts. */
    START,
    /** Family, solver library and instance are loaded. */
    LOAD,
    /** The model is built. */
    BUILD,
    /** The seed permutes variables and constraints. */
    SHUFFLE,
    /** The model is lowered to the backend. */
    LOWER,
    /** The solver works. */
    SOLVE,
    /** The answer is completed and written. */
    ANSWER;

    /** Whether the limit's clock runs in this phase. */
    public boolean limited() {
      return this == LOWER || this == SOLVE || this == ANSWER;
    }
  }

  /**
   * One phase's length.
   *
   * @param wallNanos by the monotonic clock
   * @param cpuNanos processor time of all its processes; empty where it was not measured
   */
  public record Span(long wallNanos, OptionalLong cpuNanos) {
    public Span {
      Text.require("cpuNanos", cpuNanos);
      if (wallNanos < 0 || cpuNanos.orElse(0) < 0) {
        throw new IllegalArgumentException(
            "a phase's nanoseconds must be at least 0, were %d and %s"
                .formatted(wallNanos, cpuNanos));
      }
    }
  }

  public Times {
    phases = Sorted.copy("phases", phases);
    if (overshootNanos < 0) {
      throw new IllegalArgumentException(
          "overshootNanos must be at least 0, was " + overshootNanos);
    }
  }

  /** Wall nanoseconds of a phase; 0 if it was not entered. */
  public long wallNanos(Phase phase) {
    Span span = phases.get(phase);
    return span == null ? 0 : span.wallNanos();
  }

  /** Wall nanoseconds under the limit's clock: lower, solve and answer. */
  public long limitedNanos() {
    long sum = 0;
    for (Map.Entry<Phase, Span> entry : phases.entrySet()) {
      if (entry.getKey().limited()) {
        sum = Math.addExact(sum, entry.getValue().wallNanos());
      }
    }
    return sum;
  }

  /** Processor nanoseconds of the same phases; empty if one of them was not measured. */
  public OptionalLong limitedCpuNanos() {
    long sum = 0;
    for (Map.Entry<Phase, Span> entry : phases.entrySet()) {
      if (entry.getKey().limited()) {
        if (entry.getValue().cpuNanos().isEmpty()) {
          return OptionalLong.empty();
        }
        sum = Math.addExact(sum, entry.getValue().cpuNanos().getAsLong());
      }
    }
    return OptionalLong.of(sum);
  }
}
