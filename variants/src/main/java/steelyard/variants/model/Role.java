package steelyard.variants.model;

import java.util.List;

/** What an amendment claims about itself; its rights and its audit follow from it. */
public sealed interface Role {

  /** Holds in every solution of the plain model, not only in good ones. */
  record Implied() implements Role {}

  /** May lose solutions, keeps at least one optimal. */
  record Dominance() implements Role {}

  /**
   * Keeps at least one of each set of symmetric solutions.
   *
   * @param generators the permutations that generate the symmetries
   */
  record Symmetry(List<Permutation> generators) implements Role {
    public Symmetry {
      generators = List.copyOf(generators);
    }
  }

  /** Withdraws groups and posts others with the same solutions. */
  record Reformulation() implements Role {}

  /** Changes branching or hint only. */
  record Search() implements Role {}

  /** The role's name in files and reports. */
  default String label() {
    if (this instanceof Implied) {
      return "implied";
    }
    if (this instanceof Dominance) {
      return "dominance";
    }
    if (this instanceof Symmetry) {
      return "symmetry";
    }
    return this instanceof Reformulation ? "reformulation" : "search";
  }

  /** Whether an amendment of this role may post and define. */
  default boolean mayPost() {
    return !(this instanceof Search);
  }

  /** Whether it may withdraw groups, add decision variables and replace the objective. */
  default boolean mayReplace() {
    return this instanceof Reformulation;
  }

  /** Whether it may change branching and hint. */
  default boolean mayBranch() {
    return this instanceof Search || this instanceof Reformulation;
  }
}
