package steelyard.adapters.spi;

import java.util.Objects;

/**
 * The backend cannot lower this model, or cannot be used.
 *
 * @param reason names the constraint, option or size that it cannot take, in one line
 */
public record Refusal(String reason) implements Lowered, Probe {
  public Refusal {
    Objects.requireNonNull(reason, "reason");
  }
}
