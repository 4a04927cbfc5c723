package steelyard.variants.model;

import java.util.Objects;

/**
 * Node i, counted from 0, is followed by node {@code successors[i]}, and so all nodes are visited
 * on one round tour: Lauri&egrave;re (1978), "A Language and a Program for Stating and Solving
 * Combinatorial Problems", Artificial Intelligence 10(1):29-127. False where a successor is no
 * node. A single node is followed by itself; of no nodes it is true.
 *
 * <pre>{@code
 * // The truck leaves the yard (0), calls at every shop once, and returns.
 * draft.group("tour").post(new Circuit(Views.of(next)));
 * }</pre>
 */
public record Circuit(Views successors) implements Relation {

  public Circuit {
    Objects.requireNonNull(successors, "successors");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.circuit(this);
  }

  @Override
  public Circuit rewrite(Rewriting rewriting) {
    return new Circuit(successors.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "circuit";
  }
}
