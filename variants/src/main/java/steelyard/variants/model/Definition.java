package steelyard.variants.model;

import java.util.Objects;

/**
 * A constraint that, for every value of the variables declared earlier, leaves {@code variable}
 * exactly one value. Never negated.
 */
public record Definition(int variable, Constraint constraint) {
  public Definition {
    Objects.requireNonNull(constraint, "constraint");
  }

  Definition rewrite(Rewriting rewriting) {
    return new Definition(rewriting.variable(variable), constraint.rewrite(rewriting));
  }
}
