package steelyard.variants.model;

import java.util.Objects;

/** {@code result} is the largest of at least one view; a minimum is the same over negatives. */
public record Maximum(Views terms, View result) implements Relation {

  public Maximum {
    Objects.requireNonNull(terms, "terms");
    Objects.requireNonNull(result, "result");
    if (terms.size() == 0) {
      throw new IllegalArgumentException("the maximum of nothing");
    }
  }

  /** {@code result} is the smallest of {@code terms}. */
  public static Maximum minimum(Views terms, View result) {
    return new Maximum(terms.negated(), result.negated());
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.maximum(this);
  }

  @Override
  public Maximum rewrite(Rewriting rewriting) {
    Views mapped = terms.mapped(rewriting);
    int[] order = rewriting.rows(mapped.size(), mapped::compareRows);
    return new Maximum(mapped.permuted(order), result.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "maximum";
  }
}
