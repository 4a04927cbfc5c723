package steelyard.variants.catalog.glazing;

import java.util.HashMap;
import java.util.Map;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Count;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;

/**
 * The plain model: a kind for each slot, each kind as often as ordered, and a sum for each window.
 * What is to pay, if anything, is paid for windows with too many and for changes of glaze.
 */
final class PlainGlazeLine {
  private final GlazeLine line;
  private final Draft draft;
  private final Map<String, IntVar> byName = new HashMap<>();
  private final Slots slots;

  private PlainGlazeLine(GlazeLine line, Draft draft) {
    this.line = line;
    this.draft = draft;
    this.slots = new Slots(line, byName::get);
  }

  static void write(GlazeLine line, Draft draft) {
    PlainGlazeLine model = new PlainGlazeLine(line, draft);
    model.kinds();
    model.needs();
    line.strictTreatments().forEach(model::keepWithin);
    line.pricedTreatments().forEach(model::nameOverruns);
    if (line.hasGlazes()) {
      model.glazes();
      model.boundRuns();
    }
    if (line.hasCost()) {
      draft.minimize(model.slots.cost());
    }
  }

  private void kinds() {
    for (int slot = 0; slot < line.slots(); slot++) {
      keep(draft.integer(Names.kind(slot), 0, line.kinds().size() - 1));
    }
    Group demand = draft.group(Names.DEMAND);
    for (int k = 0; k < line.kinds().size(); k++) {
      View tiles = View.constant(line.kinds().get(k).tiles());
      demand.post(new Count(slots.kinds(), Ints.of(k), Comparison.EQ, tiles));
    }
  }

  private void needs() {
    for (int t = 0; t < line.treatments().size(); t++) {
      for (int slot = 0; slot < line.slots(); slot++) {
        keep(draft.define(Names.needs(t, slot), isOneOf(slot, line.kindsWith(t))));
      }
    }
  }

  private Formula isOneOf(int slot, Ints kinds) {
    View kind = slots.kind(slot).view();
    return Formula.any(kinds.stream().mapToObj(k -> Formula.literal(kind.is(k))).toList());
  }

  private void keepWithin(int treatment) {
    Group capacity = draft.group(Names.CAPACITY);
    for (Window window : line.windows(treatment)) {
      capacity.post(slots.many(treatment, window).le(line.treatment(treatment).most()));
    }
  }

  private void nameOverruns(int treatment) {
    int most = line.treatment(treatment).most();
    for (Window window : line.windows(treatment)) {
      String name = Names.over(treatment, window.start());
      keep(draft.define(name, slots.many(treatment, window).gt(most)));
    }
  }

  private void glazes() {
    for (int slot = 0; slot < line.slots(); slot++) {
      keep(draft.define(Names.glaze(slot), Term.at(line.glazes(), slots.kind(slot))));
    }
    for (int slot = 1; slot < line.slots(); slot++) {
      Term before = byName.get(Names.glaze(slot - 1));
      keep(draft.define(Names.change(slot), byName.get(Names.glaze(slot)).ne(before)));
    }
  }

  private void boundRuns() {
    Group runs = draft.group(Names.RUNS);
    for (int first = 0; first + line.longestRun() < line.slots(); first++) {
      Window after = new Window(first + 1, first + 1 + line.longestRun());
      runs.post(Formula.any(slots.changes(after).stream().map(Slots::isTrue).toList()));
    }
  }

  private void keep(IntVar variable) {
    byName.put(variable.name(), variable);
  }
}
