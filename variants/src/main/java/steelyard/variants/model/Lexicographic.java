package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code left} comes before {@code right} in lexicographic order, or equals it where ties are
 * {@link Ties#ALLOWED}: at the first position where they differ, left is less. Two rows of no views
 * are a tie. Frisch, Hnich, Kiziltan, Miguel &amp; Walsh (2006), "Propagation Algorithms for
 * Lexicographic Ordering Constraints", Artificial Intelligence 170(10):803-834.
 *
 * <pre>{@code
 * // Two kilns that are alike: the first one's plan is not the later one in the order of plans.
 * draft.group("kilns alike").post(
 *     new Lexicographic(Views.of(firstKiln), Views.of(secondKiln), Ties.ALLOWED));
 * }</pre>
 *
 * @param right as many views as {@code left}
 */
public record Lexicographic(Views left, Views right, Ties ties) implements Relation {
  /** Whether the rows may be equal. */
  public enum Ties {
    ALLOWED,
    FORBIDDEN
  }

  public Lexicographic {
    Objects.requireNonNull(left, "left");
    Objects.requireNonNull(right, "right");
    Objects.requireNonNull(ties, "ties");
    if (left.size() != right.size()) {
      throw new IllegalArgumentException(
          "a row of " + left.size() + " views against one of " + right.size());
    }
  }

  /** The relation that holds exactly where this does not. */
  public Lexicographic negation() {
    return new Lexicographic(
        /* left= */ right, /* right= */ left, ties == Ties.ALLOWED ? Ties.FORBIDDEN : Ties.ALLOWED);
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.lexicographic(this);
  }

  @Override
  public Lexicographic rewrite(Rewriting rewriting) {
    return new Lexicographic(left.mapped(rewriting), right.mapped(rewriting), ties);
  }

  @Override
  public String kind() {
    return "lexicographic";
  }
}
