package steelyard.variants.model;

import java.util.Objects;

/**
 * {@code backward} leads back from wherever {@code forward} leads: for each i, counted from 0,
 * {@code backward[forward[i]] = i}; false where a {@code forward[i]} is outside of {@code
 * backward}. Over rows of one length this makes each a permutation and the other its inverse; where
 * {@code backward} is longer, its entries that nothing leads to are free.
 *
 * <pre>{@code
 * // Which slot a lot gets, and which lot a slot gets.
 * draft.group("slots").post(new Inverse(Views.of(slotOfLot), Views.of(lotInSlot)));
 * }</pre>
 */
public record Inverse(Views forward, Views backward) implements Relation {

  public Inverse {
    Objects.requireNonNull(forward, "forward");
    Objects.requireNonNull(backward, "backward");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.inverse(this);
  }

  @Override
  public Inverse rewrite(Rewriting rewriting) {
    return new Inverse(forward.mapped(rewriting), backward.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "inverse";
  }
}
