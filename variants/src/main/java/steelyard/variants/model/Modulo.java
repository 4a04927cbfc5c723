package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code remainder} is what {@link Division} leaves: {@code dividend - divisor * (dividend /
 * divisor)}, of the dividend's sign as Java's {@code %}: 7 % 3 = 1, -7 % 3 = -1, 7 % -3 = 1. False
 * where the divisor is 0, whatever the remainder. No view may be able to pass 10^9 in magnitude.
 *
 * <pre>{@code
 * // The same inside a formula: a firing starts on the hour.
 * draft.group("on the hour").post(start.remainder(60).eq(0));
 * }</pre>
 */
public record Modulo(View dividend, View divisor, View remainder) implements Relation {

  public Modulo {
    Objects.requireNonNull(dividend, "dividend");
    Objects.requireNonNull(divisor, "divisor");
    Objects.requireNonNull(remainder, "remainder");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.modulo(this);
  }

  @Override
  public Modulo rewrite(Rewriting rewriting) {
    return new Modulo(
        dividend.mapped(rewriting), divisor.mapped(rewriting), remainder.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "modulo";
  }
}
