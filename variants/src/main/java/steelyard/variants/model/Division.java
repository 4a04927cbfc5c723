package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code dividend / divisor = quotient}, rounded toward 0 as Java's {@code /} does: 7 / 2 = 3, -7 /
 * 2 = -3, 7 / -2 = -3. False where the divisor is 0, whatever the quotient. No view may be able to
 * pass 10^9 in magnitude.
 *
 * <pre>{@code
 * // The same inside a formula: full pallets of 48 tiles.
 * draft.group("pallets").post(tiles.dividedBy(48).le(pallets));
 * }</pre>
 */
public record Division(View dividend, View divisor, View quotient) implements Relation {

  public Division {
    Objects.requireNonNull(dividend, "dividend");
    Objects.requireNonNull(divisor, "divisor");
    Objects.requireNonNull(quotient, "quotient");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.division(this);
  }

  @Override
  public Division rewrite(Rewriting rewriting) {
    return new Division(
        dividend.mapped(rewriting), divisor.mapped(rewriting), quotient.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "division";
  }
}
