package steelyard.variants.model;

import java.util.Objects;

/**
 * How many different values the views have, compared with {@code bound}: {@code |{scope[i]}| OP
 * bound}. With {@code =} it is the number-of-values relation, with {@code <=} at-most-n-values:
 * Pachet &amp; Roy (1999), "Automatic Generation of Music Programs", CP, LNCS 1713:331-345;
 * Bessi&egrave;re, Hebrard, Hnich, Kiziltan &amp; Walsh (2006), "Filtering Algorithms for the
 * NValue Constraint", Constraints 11(4):271-293.
 *
 * <p>Of no views, the number is 0.
 *
 * <pre>{@code
 * // The orders of a truck come out of at most 2 kilns.
 * draft.group("few kilns").post(
 *     new DistinctValues(Views.of(kilns), Comparison.LE, View.constant(2)));
 * }</pre>
 */
public record DistinctValues(Views scope, Comparison op, View bound) implements Relation {

  public DistinctValues {
    Objects.requireNonNull(scope, "scope");
    Objects.requireNonNull(op, "op");
    Objects.requireNonNull(bound, "bound");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.distinctValues(this);
  }

  @Override
  public DistinctValues rewrite(Rewriting rewriting) {
    Views mapped = scope.mapped(rewriting);
    int[] order = rewriting.rows(mapped.size(), mapped::compareRows);
    return new DistinctValues(mapped.permuted(order), op, bound.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "distinct-values";
  }
}
