package steelyard.variants.catalog.glazing;

import java.util.List;
import java.util.Optional;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Other ways to say that no window of a strict treatment has too many. */
final class WindowForms {
  private WindowForms() {}

  /**
   * The kinds themselves are counted: Beldiceanu &amp; Contejean (1994), "Introducing Global
   * Constraints in CHIP", Mathematical and Computer Modelling 20(12):97-123.
   */
  static void among(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    replace(
        line,
        change,
        (treatment, group) -> {
          Ints kinds = line.kindsWith(treatment);
          View most = View.constant(line.treatment(treatment).most());
          for (Window window : line.windows(treatment)) {
            group.post(new Count(slots.kinds(window), kinds, Comparison.LE, most));
          }
        });
  }

  /**
   * One automaton per treatment remembers the tiles of a window: van Hoeve, Pesant, Rousseau &amp;
   * Sabharwal (2009), "New Filtering Algorithms for Combinations of Among Constraints", Constraints
   * 14(2):273-292, section 4. A treatment with too many states keeps its sums.
   */
  static void automata(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    replace(
        line,
        change,
        (treatment, group) -> {
          Optional<Automaton> automaton = WindowAutomaton.of(line.treatment(treatment));
          if (automaton.isPresent()) {
            Views needs = Views.of(slots.needs(treatment));
            group.post(new Regular(needs, automaton.get()));
          } else {
            int most = line.treatment(treatment).most();
            line.windows(treatment).forEach(w -> group.post(slots.many(treatment, w).le(most)));
          }
        });
  }

  /**
   * Running counts, and a window is the difference of two: the cumulative sums of Brand,
   * Narodytska, Quimper, Stuckey &amp; Walsh (2007), "Encodings of the Sequence Constraint", CP,
   * LNCS 4741:210-224.
   */
  static void runningCounts(GlazeLine line, Change change) {
    replace(
        line,
        change,
        (treatment, group) -> {
          List<View> soFar = soFar(treatment, line, change);
          int most = line.treatment(treatment).most();
          for (Window window : line.windows(treatment)) {
            group.post(soFar.get(window.end()).minus(soFar.get(window.start())).le(most));
          }
        });
  }

  /** The name of the count of tiles with the treatment in the first {@code slots} slots. */
  static String soFar(int treatment, int slots) {
    return "so far[" + treatment + "." + slots + "]";
  }

  private static List<View> soFar(int treatment, GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    View[] soFar = new View[line.slots() + 1];
    soFar[0] = View.constant(0);
    for (int slot = 0; slot < line.slots(); slot++) {
      Term next = soFar[slot].plus(slots.needs(treatment, slot));
      soFar[slot + 1] = change.define(soFar(treatment, slot + 1), next).view();
    }
    return List.of(soFar);
  }

  /** How the windows of one strict treatment are said. */
  private interface Form {
    void post(int treatment, Group group);
  }

  private static void replace(GlazeLine line, Change change, Form form) {
    List<Integer> bounded =
        line.strictTreatments().stream().filter(t -> !line.windows(t).isEmpty()).toList();
    if (!bounded.isEmpty()) {
      change.withdraw(Names.CAPACITY);
      bounded.forEach(treatment -> form.post(treatment, change.group(Names.CAPACITY)));
    }
  }
}
