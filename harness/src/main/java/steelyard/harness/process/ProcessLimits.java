package steelyard.harness.process;

import java.time.Duration;
import java.util.Collections;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.TreeSet;

/**
 * What a child may use. Time is counted by clocks: each phase that the child says it is in runs one
 * of them, and a clock that ran out ends the child, however often it changed phase. The sum of the
 * clocks therefore bounds the life of any child.
 *
 * @param wall the limit on the main clock: the child is asked to stop when it is reached
 * @param mainPhases the phases that the main clock counts
 * @param grace the child is killed this long after {@code wall} if it still is in a main phase, and
 *     this long after an operator's stop
 * @param allowances for each other phase with a clock of its own; its end kills at once
 * @param otherPhases for all phases not named here, together
 * @param memoryBytes resident memory of all processes of the child together
 * @param outputBytes standard output and standard error are each cut when they pass this
 */
public record ProcessLimits(
    Duration wall,
    Set<String> mainPhases,
    Duration grace,
    SortedMap<String, Duration> allowances,
    Duration otherPhases,
    long memoryBytes,
    long outputBytes) {

  /** The phase of a child that has not said anything yet. */
  public static final String START = "start";

  public static final Duration DEFAULT_GRACE = Duration.ofMillis(800);
  public static final long DEFAULT_OUTPUT_BYTES = 16L << 20;

  public ProcessLimits {
    mainPhases = Collections.unmodifiableSortedSet(new TreeSet<>(mainPhases));
    allowances = Collections.unmodifiableSortedMap(new TreeMap<>(allowances));
    requirePositive("wall limit", wall);
    requirePositive("allowance of other phases", otherPhases);
    allowances.forEach((phase, allowed) -> requirePositive("allowance of " + phase, allowed));
    if (grace.isNegative()) {
      throw new IllegalArgumentException("grace " + grace + " is negative");
    }
    if (memoryBytes <= 0 || outputBytes <= 0) {
      throw new IllegalArgumentException(
          "limits of memory (" + memoryBytes + ") and output (" + outputBytes + ") are positive");
    }
    if (allowances.keySet().stream().anyMatch(mainPhases::contains)) {
      throw new IllegalArgumentException(
          "a phase has one clock: " + allowances + ", " + mainPhases);
    }
  }

  /** For a program that says nothing of phases: the main clock runs from the start. */
  public static ProcessLimits plain(Duration wall, long memoryBytes) {
    return new ProcessLimits(
        wall,
        Set.of(START),
        DEFAULT_GRACE,
        Collections.emptySortedMap(),
        wall,
        memoryBytes,
        DEFAULT_OUTPUT_BYTES);
  }

  /** The clock that a phase runs. */
  Clock clock(String phase) {
    if (mainPhases.contains(phase)) {
      return new Clock("", wall, true);
    }
    Duration allowed = allowances.get(phase);
    return allowed == null ? new Clock("", otherPhases, false) : new Clock(phase, allowed, false);
  }

  /** A clock by name, the time that it may count, and whether it is the main one. */
  record Clock(String name, Duration allowed, boolean main) {}

  private static void requirePositive(String what, Duration duration) {
    if (duration.isZero() || duration.isNegative()) {
      throw new IllegalArgumentException(what + " " + duration + " is not positive");
    }
  }
}
