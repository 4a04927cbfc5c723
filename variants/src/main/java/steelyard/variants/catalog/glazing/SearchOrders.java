package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Branching.ValueOrder;
import steelyard.variants.model.Branching.VariableOrder;
import steelyard.variants.model.Viewable;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/**
 * Branchings and a hint; they change no solutions. Which order suits is the subject of Smith
 * (1996), "Succeed-first or fail-first: a case study in variable and value ordering heuristics",
 * School of Computer Studies report 96.26, University of Leeds, and of Siala, Hebrard &amp; Huguet
 * (2015), "A study of constraint programming heuristics for the car-sequencing problem",
 * Engineering Applications of Artificial Intelligence 38:34-44: by slot or by treatment, from the
 * line's end or its middle, the scarcest treatment first.
 */
final class SearchOrders {
  private SearchOrders() {}

  /** The treatment that leaves least room first, all along the line. */
  static void treatmentByTreatment(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    for (int t : scarcestFirst(line)) {
      change.branch(Views.of(slots.needs(t)), VariableOrder.INPUT, ValueOrder.MAX);
    }
    change.branch(slots.kinds(), VariableOrder.INPUT, ValueOrder.MIN);
  }

  /** One slot after the other: a tile with the scarcest treatments that go there. */
  static void slotBySlot(GlazeLine line, Change change) {
    bySlot(IntStream.range(0, line.slots()), line, change);
  }

  /** The same from the middle of the line to both ends in turn. */
  static void middleOut(GlazeLine line, Change change) {
    bySlot(fromTheMiddle(line.slots()), line, change);
  }

  static void greedyHint(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    List<Integer> kinds = GreedyLine.of(line);
    for (int slot = 0; slot < kinds.size(); slot++) {
      change.hint(slots.kind(slot), kinds.get(slot));
    }
  }

  private static void bySlot(IntStream order, GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    List<Integer> treatments = scarcestFirst(line);
    List<Viewable> views = new ArrayList<>();
    order.forEach(
        slot -> {
          treatments.forEach(t -> views.add(slots.needs(t, slot)));
          views.add(slots.kind(slot));
        });
    change.branch(Views.of(views), VariableOrder.INPUT, ValueOrder.MAX);
  }

  /** Middle, one after it, one before it, two after it, and so on. */
  static IntStream fromTheMiddle(int slots) {
    int middle = (slots - 1) / 2;
    return IntStream.range(0, slots).map(i -> i % 2 == 0 ? middle - i / 2 : middle + i / 2 + 1);
  }

  /** By the share of its room that is ordered, {@code tiles*q/p}, falling. */
  static List<Integer> scarcestFirst(GlazeLine line) {
    Comparator<Integer> byRoomLeft =
        Comparator.comparingDouble(
            t ->
                -(double) line.tilesWith(t)
                    * line.treatment(t).window()
                    / line.treatment(t).most());
    return IntStream.range(0, line.treatments().size()).boxed().sorted(byRoomLeft).toList();
  }
}
