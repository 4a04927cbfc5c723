package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.build.Change;

/** Another way to say that no run of one glaze is too long. */
final class RunForms {
  private RunForms() {}

  /**
   * One automaton over the glazes, whose state is the glaze that runs and since when: a stretch
   * constraint, as in Pesant (2004), "A Regular Language Membership Constraint for Finite Sequences
   * of Variables", CP, LNCS 3258:482-495.
   */
  static void automaton(GlazeLine line, Change change) {
    if (line.longestRun() < line.slots()) {
      change.withdraw(Names.RUNS);
      Slots slots = new Slots(line, change::variable);
      change.group(Names.RUNS).post(new Regular(slots.glazes(), runs(line)));
    }
  }

  /** State 0 is the start; then come the first tile of the first glaze, the second, and so on. */
  static Automaton runs(GlazeLine line) {
    int[] glazes = line.glazes().stream().sorted().distinct().toArray();
    int longest = line.longestRun();
    List<int[]> transitions = new ArrayList<>();
    for (int g = 0; g < glazes.length; g++) {
      transitions.add(new int[] {0, glazes[g], state(g, 1, longest)});
      for (int tiles = 1; tiles <= longest; tiles++) {
        int from = state(g, tiles, longest);
        for (int next = 0; next < glazes.length; next++) {
          if (next != g) {
            transitions.add(new int[] {from, glazes[next], state(next, 1, longest)});
          } else if (tiles < longest) {
            transitions.add(new int[] {from, glazes[g], state(g, tiles + 1, longest)});
          }
        }
      }
    }
    int states = 1 + glazes.length * longest;
    Ints all = Ints.of(IntStream.range(0, states).toArray());
    return new Automaton(states, 0, all, Tuples.of(3, transitions));
  }

  private static int state(int glaze, int tiles, int longest) {
    return glaze * longest + tiles;
  }
}
