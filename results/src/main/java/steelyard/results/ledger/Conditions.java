package steelyard.results.ledger;

import java.util.SortedSet;

/**
 * Under what conditions a run was made.
 *
 * @param seed the seed; 0 changes nothing
 * @param threads how many the solver was given; at least 1
 * @param goal what it was asked for
 * @param limits what it was allowed
 * @param evidence the kinds of evidence asked for
 * @param mode whether the process was fresh
 */
public record Conditions(
    long seed, int threads, Goal goal, Limits limits, SortedSet<String> evidence, Mode mode) {

  /** Whether the process had solved anything before. */
  public enum Mode {
    /** A fresh process. */
    COLD,
    /** A process that has solved a warm-up instance. */
    WARM
  }

  public Conditions {
    if (threads < 1) {
      throw new IllegalArgumentException("threads must be at least 1, was " + threads);
    }
    Text.require("goal", goal);
    Text.require("limits", limits);
    evidence = Sorted.copy("evidence", evidence);
    Text.require("mode", mode);
  }
}
