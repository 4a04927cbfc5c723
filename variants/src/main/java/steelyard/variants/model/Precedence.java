package steelyard.variants.model;

import java.util.Objects;

/**
 * Each of the values but the first stands only after the one before it: where {@code scope[j] =
 * values[k + 1]}, there is an i &lt; j with {@code scope[i] = values[k]}. Breaks the symmetry of
 * values that are alike: Law &amp; Lee (2004), "Global Constraints for Integer and Set Value
 * Precedence", CP, LNCS 3258:362-376. Other values are free to stand anywhere.
 *
 * <pre>{@code
 * // Kilns 1, 2 and 3 are alike: the first lot that is not in kiln 1 is in kiln 2, and so on.
 * draft.group("kilns alike").post(new Precedence(Views.of(kilnOfLot), Ints.of(1, 2, 3)));
 * }</pre>
 *
 * @param values distinct
 */
public record Precedence(Views scope, Ints values) implements Relation {

  public Precedence {
    Objects.requireNonNull(scope, "scope");
    values.requireDistinctValues("a preceding value");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.precedence(this);
  }

  @Override
  public Precedence rewrite(Rewriting rewriting) {
    return new Precedence(scope.mapped(rewriting), values);
  }

  @Override
  public String kind() {
    return "precedence";
  }
}
