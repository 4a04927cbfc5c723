package steelyard.variants.model;

import java.util.Objects;

/**
 * The automaton accepts the views' values, read in order: Pesant (2004), "A Regular Language
 * Membership Constraint for Finite Sequences of Variables", CP, LNCS 3258:482-495. Of no views it
 * is true where the automaton accepts in its start state.
 *
 * <pre>{@code
 * // Kiln programs by hour: after a glaze firing (2) the kiln cools (0) at least once.
 * Automaton cooling = Automaton.of(2, Ints.of(0, 1),
 *     new int[] {0, 0, 0}, new int[] {0, 1, 0}, new int[] {0, 2, 1}, new int[] {1, 0, 0});
 * draft.group("cool after glaze").post(new Regular(Views.of(hours), cooling));
 * }</pre>
 */
public record Regular(Views word, Automaton automaton) implements Relation {

  public Regular {
    Objects.requireNonNull(word, "word");
    Objects.requireNonNull(automaton, "automaton");
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.regular(this);
  }

  @Override
  public Regular rewrite(Rewriting rewriting) {
    return new Regular(word.mapped(rewriting), automaton);
  }

  @Override
  public String kind() {
    return "regular";
  }
}
