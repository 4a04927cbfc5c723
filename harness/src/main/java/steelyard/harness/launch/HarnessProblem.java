package steelyard.harness.launch;

import java.io.IOException;
import steelyard.results.ledger.Reasons;

/** What keeps the harness from its task, in one line for people: what, where, what to do. */
public final class HarnessProblem extends RuntimeException {
  private static final long serialVersionUID = 1L;

  public HarnessProblem(String message) {
    super(message);
  }

  public HarnessProblem(String message, Throwable cause) {
    super(message, cause);
  }

  /** What could not be done with a file, and why. */
  public static HarnessProblem of(String what, IOException e) {
    return new HarnessProblem(what + ": " + Reasons.of(e), e);
  }
}
