package steelyard.variants.model;

import java.util.Objects;

/**
 * How many of the views have a value in {@code values}, compared with {@code bound}: {@code |{i :
 * scope[i] in values}| OP bound}. With one value it is the relation often called count, exactly, at
 * least or at most; with several and {@code =} it is among: Beldiceanu &amp; Contejean (1994),
 * "Introducing Global Constraints in CHIP", Mathematical and Computer Modelling 20(12):97-123.
 *
 * <p>A view that stands there twice counts twice; of no views, or with no values, the number is 0.
 *
 * <pre>{@code
 * // At most 3 firings of the day are high firings (programs 4 and 5).
 * draft.group("high firings").post(
 *     new Count(Views.of(programs), Ints.of(4, 5), Comparison.LE, View.constant(3)));
 * }</pre>
 *
 * @param values distinct
 */
public record Count(Views scope, Ints values, Comparison op, View bound) implements Relation {

  public Count {
    Objects.requireNonNull(scope, "scope");
    Objects.requireNonNull(op, "op");
    Objects.requireNonNull(bound, "bound");
    values.requireDistinctValues("a counted value");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.count(this);
  }

  @Override
  public Count rewrite(Rewriting rewriting) {
    Views mapped = scope.mapped(rewriting);
    return new Count(
        mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)),
        values.permuted(rewriting.rows(values.size(), values::compareRows)),
        op,
        bound.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "count";
  }
}
