package steelyard.variants.model;

import java.util.Objects;

/**
 * A relation under a condition: half and full reification and negation in one form, never nested.
 * The negation of R is {@code (FALSE, ONLY_IF, R)}.
 */
public record Conditional(Atom when, Mode mode, Relation then) implements Constraint {
  /** Which way the implication goes. */
  public enum Mode {
    /** {@code when} implies {@code then}. */
    IF,
    /** {@code then} implies {@code when}. */
    ONLY_IF,
    /** Both are true or both are false. */
    IFF;

    public boolean holds(boolean when, boolean then) {
      return switch (this) {
        case IF -> !when || then;
        case ONLY_IF -> when || !then;
        case IFF -> when == then;
      };
    }
  }

  public Conditional {
    Objects.requireNonNull(when, "when");
    Objects.requireNonNull(mode, "mode");
    Objects.requireNonNull(then, "then");
  }

  /** The constraint that {@code relation} does not hold. */
  public static Conditional not(Relation relation) {
    return new Conditional(Atom.FALSE, Mode.ONLY_IF, relation);
  }

  @Override
  public Conditional rewrite(Rewriting rewriting) {
    return new Conditional(when.mapped(rewriting), mode, then.rewrite(rewriting));
  }

  @Override
  public String toString() {
    return when + " " + mode + " " + then;
  }
}
