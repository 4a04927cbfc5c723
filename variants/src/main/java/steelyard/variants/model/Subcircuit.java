package steelyard.variants.model;

import java.util.Objects;

/**
 * Node i, counted from 0, stays out where {@code successors[i] = i}; the others, if there are any,
 * are visited on one round tour, each followed by its successor: {@link Circuit} on some of the
 * nodes. False where a successor is no node; true where all stay out.
 *
 * <pre>{@code
 * // The truck calls at some of the shops; shop 4 is one of them.
 * draft.group("tour").post(new Subcircuit(Views.of(next)));
 * draft.group("tour").post(next.get(4).ne(4));
 * }</pre>
 */
public record Subcircuit(Views successors) implements Relation {

  public Subcircuit {
    Objects.requireNonNull(successors, "successors");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.subcircuit(this);
  }

  @Override
  public Subcircuit rewrite(Rewriting rewriting) {
    return new Subcircuit(successors.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "subcircuit";
  }
}
