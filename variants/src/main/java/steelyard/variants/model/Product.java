package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code left * right = result}. Neither factor may be able to pass 10^9 in magnitude.
 *
 * <pre>{@code
 * // The same inside a formula: rows times tiles per row cover the order.
 * draft.group("cover").post(rows.times(perRow).ge(ordered));
 * }</pre>
 */
public record Product(View left, View right, View result) implements Relation {

  public Product {
    Objects.requireNonNull(left, "left");
    Objects.requireNonNull(right, "right");
    Objects.requireNonNull(result, "result");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.product(this);
  }

  @Override
  public Product rewrite(Rewriting rewriting) {
    Views factors = Views.of(left, right).mapped(rewriting);
    Views ordered = factors.permuted(rewriting.rows(2, factors::compareRows));
    return new Product(ordered.get(0), ordered.get(1), result.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "product";
  }
}
