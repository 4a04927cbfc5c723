package steelyard.variants.model;

import java.util.Objects;

/**
 * For each k, exactly {@code counts[k]} of the views have the value {@code values[k]}. Where the
 * relation is {@link Others#FORBIDDEN closed}, every view has one of the values; where it is {@link
 * Others#ALLOWED open}, views of other values are not counted. R&eacute;gin (1996), "Generalized
 * Arc Consistency for Global Cardinality Constraint", AAAI, 209-215.
 *
 * <p>A view that stands there twice counts twice; of no views, every count is 0.
 *
 * <pre>{@code
 * // Over the week, 2 or 3 firings with the matt glaze (7), as many as wanted with others.
 * IntVar matt = draft.integer("matt firings", 2, 3);
 * draft.group("matt glaze").post(
 *     new GlobalCardinality(Views.of(glazes), Ints.of(7), Views.of(matt), Others.ALLOWED));
 * }</pre>
 *
 * @param values distinct
 * @param counts as many
 */
public record GlobalCardinality(Views scope, Ints values, Views counts, Others others)
    implements Relation {
  /** Whether a view may have a value that is not counted. */
  public enum Others {
    ALLOWED,
    FORBIDDEN
  }

  public GlobalCardinality {
    Objects.requireNonNull(scope, "scope");
    Objects.requireNonNull(counts, "counts");
    Objects.requireNonNull(others, "others");
    values.requireDistinctValues("a counted value");
    if (values.size() != counts.size()) {
      throw new IllegalArgumentException(
          values.size() + " values with " + counts.size() + " counts");
    }
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.globalCardinality(this);
  }

  @Override
  public GlobalCardinality rewrite(Rewriting rewriting) {
    Views mapped = scope.mapped(rewriting);
    Views amounts = counts.mapped(rewriting);
    int[] order = rewriting.rows(values.size(), values::compareRows);
    return new GlobalCardinality(
        mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)),
        values.permuted(order),
        amounts.permuted(order),
        others);
  }

  @Override
  public String kind() {
    return "global-cardinality";
  }
}
