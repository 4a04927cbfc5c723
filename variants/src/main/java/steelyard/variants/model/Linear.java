package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code sum OP bound}.
 *
 * @param sum its constant is 0: constants stand on the right
 * @param bound at most {@link LinearSum#LIMIT} in magnitude
 */
public record Linear(LinearSum sum, Comparison op, long bound) implements Relation {

  public Linear {
    Objects.requireNonNull(sum, "sum");
    Objects.requireNonNull(op, "op");
    if (sum.constant() != 0) {
      throw new IllegalArgumentException("the constant of a linear relation stands on the right");
    }
    if (bound > LinearSum.LIMIT || bound < -LinearSum.LIMIT) {
      throw new IllegalArgumentException("bound " + bound + " is beyond 2^62 - 1");
    }
  }

  /** {@code sum OP bound}, the sum's constant moved to the right. */
  public static Linear of(LinearSum sum, Comparison op, long bound) {
    return new Linear(
        new LinearSum(sum.variables(), sum.coefficients(), 0),
        op,
        Math.subtractExact(bound, sum.constant()));
  }

  /** Whether every coefficient is {@code value}. */
  public boolean allCoefficientsAre(long value) {
    return sum.coefficients().stream().allMatch(a -> a == value);
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.linear(this);
  }

  @Override
  public Linear rewrite(Rewriting rewriting) {
    return new Linear(sum.rewrite(rewriting), op, bound);
  }

  @Override
  public String kind() {
    return "linear";
  }

  @Override
  public String toString() {
    return sum + " " + op + " " + bound;
  }
}
