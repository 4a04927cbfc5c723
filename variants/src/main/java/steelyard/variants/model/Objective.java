package steelyard.variants.model;

import java.util.Objects;

/** The one objective of a model: a linear sum, minimised or maximised. */
public record Objective(Sense sense, LinearSum sum) {
  /** Which way is better. */
  public enum Sense {
    MINIMIZE,
    MAXIMIZE;

    /** Whether {@code a} is strictly better than {@code b}. */
    public boolean better(long a, long b) {
      return this == MINIMIZE ? a < b : a > b;
    }
  }

  public Objective {
    Objects.requireNonNull(sense, "sense");
    Objects.requireNonNull(sum, "sum");
  }
}
