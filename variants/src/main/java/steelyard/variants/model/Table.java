package steelyard.variants.model;

import java.util.Objects;

/**
 * The views' values together are one of the rows ({@link Polarity#ALLOWED}), or none of them
 * ({@link Polarity#FORBIDDEN}). An entry {@link Tuples#ANY} matches every value.
 */
public record Table(Views scope, Tuples rows, Polarity polarity) implements Relation {
  /** Whether the rows are what may be or what may not be. */
  public enum Polarity {
    ALLOWED,
    FORBIDDEN
  }

  public Table {
    Objects.requireNonNull(scope, "scope");
    Objects.requireNonNull(rows, "rows");
    Objects.requireNonNull(polarity, "polarity");
    if (scope.size() != rows.arity()) {
      throw new IllegalArgumentException(
          "a table of " + rows.arity() + " columns over " + scope.size() + " views");
    }
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.table(this);
  }

  @Override
  public Table rewrite(Rewriting rewriting) {
    int[] order = rewriting.rows(rows.size(), rows::compareRows);
    return new Table(scope.mapped(rewriting), rows.permuted(order), polarity);
  }

  @Override
  public String kind() {
    return "table";
  }
}
