package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code |operand| = result}; false where the result is negative.
 *
 * <pre>{@code
 * // The same inside a formula: two lots are fired at least 3 programs apart.
 * draft.group("programs apart").post(Term.abs(first.minus(second)).ge(3));
 * }</pre>
 */
public record Absolute(View operand, View result) implements Relation {

  public Absolute {
    Objects.requireNonNull(operand, "operand");
    Objects.requireNonNull(result, "result");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.absolute(this);
  }

  @Override
  public Absolute rewrite(Rewriting rewriting) {
    return new Absolute(operand.mapped(rewriting), result.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "absolute";
  }
}
