package steelyard.results.ledger;

import java.util.Optional;
import java.util.OptionalLong;

/**
 * What a run established and how it ended.
 *
 * @param status what it established
 * @param ending how it ended
 * @param why the backend's own word for why it stopped; empty if it did not come to say it
 * @param killed why its processes were killed; empty if they ended by themselves
 * @param reason free text for people, such as what was refused; cut at 2,000 characters
 * @param minimize false if the objective is maximised; true also for satisfaction problems
 * @param objective the best solution's exact objective; empty without a solution or objective
 * @param bound the proved bound on the objective; empty without one
 */
public record Outcome(
    Status status,
    Ending ending,
    Optional<String> why,
    Optional<String> killed,
    Optional<String> reason,
    boolean minimize,
    OptionalLong objective,
    OptionalLong bound) {

  static final int MOST_REASON = 2_000;

  public Outcome {
    Text.require("status", status);
    Text.require("ending", ending);
    Text.require("why", why);
    Text.require("killed", killed);
    reason = Text.require("reason", reason).map(text -> Text.head(text, MOST_REASON));
    Text.require("objective", objective);
    Text.require("bound", bound);
    if (status == Status.OPTIMAL && objective.isEmpty()) {
      throw new IllegalArgumentException("an OPTIMAL run has an objective");
    }
    if ((status == Status.INFEASIBLE || status == Status.UNKNOWN) && objective.isPresent()) {
      throw new IllegalArgumentException(
          "a run that is %s has no objective, was %d".formatted(status, objective.getAsLong()));
    }
  }

  /** Whether the run found a solution. */
  public boolean hasSolution() {
    return status == Status.OPTIMAL || status == Status.FEASIBLE;
  }
}
