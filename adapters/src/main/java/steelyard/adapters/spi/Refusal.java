package steelyard.adapters.spi;

import java.util.Objects;

/**
 * The backend cannot lower this model.
 *
 * @param reason names the constraint, option or size that it cannot take, in one line
 */
public record Refusal(String reason) implements Lowered {
  public Refusal {
    Objects.requireNonNull(reason, "reason");
  }
}
