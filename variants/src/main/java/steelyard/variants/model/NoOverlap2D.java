package steelyard.variants.model;

import java.util.Arrays;
import java.util.Objects;
import java.util.function.IntBinaryOperator;

/**
 * Of any two present boxes, one ends no later than the other starts, across or up. Box i is {@code
 * across[i]} by {@code up[i]}, and is present where both of them are. A box without width or height
 * may not lie strictly inside another, as with {@link NoOverlap}.
 *
 * <pre>{@code
 * // Batches on a kiln shelf: 30 by 20 and 15 by 40 centimetres.
 * draft.group("shelf").post(NoOverlap2D.of(
 *     new Box(Task.fixed(x1, 30), Task.fixed(y1, 20)),
 *     new Box(Task.fixed(x2, 15), Task.fixed(y2, 40))));
 * }</pre>
 *
 * @param across each box's span from left to right
 * @param up each box's span from bottom to top, as many
 */
public record NoOverlap2D(Tasks across, Tasks up) implements Relation {
  /** A rectangle; what is said of a {@link Task} holds for each side. */
  public record Box(Task across, Task up) {
    public Box {
      Objects.requireNonNull(across, "across");
      Objects.requireNonNull(up, "up");
    }
  }

  public NoOverlap2D {
    Objects.requireNonNull(across, "across");
    Objects.requireNonNull(up, "up");
    if (across.size() != up.size()) {
      throw new IllegalArgumentException(
          across.size() + " spans across with " + up.size() + " spans up");
    }
  }

  public static NoOverlap2D of(Box... boxes) {
    return new NoOverlap2D(
        Tasks.of(Arrays.stream(boxes).map(Box::across).toList()),
        Tasks.of(Arrays.stream(boxes).map(Box::up).toList()));
  }

  /** How many boxes there are, present or not. */
  public int size() {
    return across.size();
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.noOverlap2D(this);
  }

  @Override
  public NoOverlap2D rewrite(Rewriting rewriting) {
    Tasks x = across.mapped(rewriting);
    Tasks y = up.mapped(rewriting);
    IntBinaryOperator byContent =
        (i, j) -> {
          int byX = x.compareRows(i, j);
          return byX != 0 ? byX : y.compareRows(i, j);
        };
    int[] order = rewriting.rows(x.size(), byContent);
    return new NoOverlap2D(x.permuted(order), y.permuted(order));
  }

  @Override
  public String kind() {
    return "no-overlap-2d";
  }
}
