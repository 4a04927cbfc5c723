package steelyard.results.ledger;

import java.time.Instant;
import java.time.temporal.ChronoUnit;

/**
 * Who writes to a ledger, told to whoever else wants to.
 *
 * @param pid the process
 * @param purpose what it does, such as {@code sweep nightly}
 * @param since when it began
 */
public record Holder(long pid, String purpose, Instant since) {
  public Holder {
    Text.requireName("purpose", purpose);
    Text.require("since", since);
  }

  /** One line for people. */
  String line() {
    return "process %d, %s, since %s"
        .formatted(pid, purpose, since.truncatedTo(ChronoUnit.SECONDS));
  }
}
