package steelyard.adapters.spi;

import java.util.Objects;
import steelyard.variants.model.Ints;

/** What a solve is asked for. */
public sealed interface Goal {

  /** Any solution; an objective is ignored. */
  record Satisfy() implements Goal {}

  /** A best solution, proved; each better one is reported as it is found. */
  record Optimise() implements Goal {}

  /**
   * Every solution, each once as seen on {@code projection}.
   *
   * @param projection variables by id; solutions that agree on them count once
   * @param atMost stop after so many
   */
  record Enumerate(Ints projection, long atMost) implements Goal {
    public Enumerate {
      Objects.requireNonNull(projection, "projection");
      if (atMost < 1) {
        throw new IllegalArgumentException("enumerate at least one solution, not " + atMost);
      }
    }
  }
}
