package steelyard.harness.sweep;

import java.util.Objects;

/**
 * How a worker makes the model of a run. A kind each for everything that the run path can carry; a
 * worker that does not know a kind refuses it by name.
 */
public sealed interface Recipe {

  /**
   * A variant of a family on an instance.
   *
   * @param of what a finished run says of its model's making
   */
  record OfVariant(steelyard.results.ledger.Recipe of) implements Recipe {
    public OfVariant {
      Objects.requireNonNull(of, "of");
    }
  }
}
