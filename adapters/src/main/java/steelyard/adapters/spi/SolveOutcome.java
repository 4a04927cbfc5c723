package steelyard.adapters.spi;

import java.util.Objects;
import java.util.OptionalLong;

/**
 * How a solve ended.
 *
 * @param bound what the objective is proved not to be better than; exact, the constant included
 * @param ended why it returned
 * @param reason for {@link Why#REFUSED} and {@link Why#FAILED}, what the solver said; else empty
 */
public record SolveOutcome(Status status, OptionalLong bound, Why ended, String reason) {
  /** Why a solve returned. */
  public enum Why {
    /** The goal is answered: the search space is exhausted, or the wanted solutions are found. */
    EXHAUSTED,
    /** The wall limit passed. */
    WALL,
    /** The work limit is used up. */
    WORK,
    /** A stop was asked. */
    STOPPED,
    /** The solver would not run this model. */
    REFUSED,
    /** The solver broke off, gave up or answered what cannot be right. */
    FAILED
  }

  public SolveOutcome {
    Objects.requireNonNull(status, "status");
    Objects.requireNonNull(bound, "bound");
    Objects.requireNonNull(ended, "ended");
    Objects.requireNonNull(reason, "reason");
  }

  public static SolveOutcome of(Status status, OptionalLong bound, Why ended) {
    return new SolveOutcome(status, bound, ended, "");
  }
}
