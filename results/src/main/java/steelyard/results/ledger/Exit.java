package steelyard.results.ledger;

import java.util.OptionalInt;

/**
 * What a run's process left behind.
 *
 * @param code its exit code; empty if it never started or was never seen to end
 * @param stderrTail the end of its standard error; cut at 8,000 characters
 */
public record Exit(OptionalInt code, String stderrTail) {

  static final int MOST_STDERR = 8_000;

  public Exit {
    Text.require("exit code", code);
    stderrTail = Text.tail(Text.require("stderrTail", stderrTail), MOST_STDERR);
  }
}
