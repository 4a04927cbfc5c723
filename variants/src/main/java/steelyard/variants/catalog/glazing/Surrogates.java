package steelyard.variants.catalog.glazing;

import steelyard.variants.model.IntVar;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints on how many tiles with a treatment must have passed by when. */
final class Surrogates {
  private Surrogates() {}

  /** All tiles with a treatment pass: the sum of what is ordered of the kinds with it. */
  static void totals(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    Group group = change.group("all tiles with a treatment pass");
    Window all = new Window(0, line.slots());
    for (int t = 0; t < line.treatments().size(); t++) {
      group.post(slots.many(t, all).eq(line.tilesWith(t)));
    }
  }

  /**
   * The last {@code k} windows take at most {@code k} times what one can take, so that the rest
   * must have passed before: Dincbas, Simonis &amp; Van Hentenryck (1988), "Solving the
   * Car-Sequencing Problem in Constraint Logic Programming", ECAI, 290-295.
   */
  static void demand(GlazeLine line, Change change) {
    Slots slots = new Slots(line, change::variable);
    Group group = change.group("enough pass before the last windows");
    for (int t : line.strictTreatments()) {
      Treatment treatment = line.treatment(t);
      int before = line.slots() - treatment.window();
      int rest = line.tilesWith(t) - treatment.most();
      while (before >= 0 && rest > 0) {
        group.post(slots.many(t, new Window(0, before)).ge(rest));
        before -= treatment.window();
        rest -= treatment.most();
      }
    }
  }

  /**
   * The same for every number of slots and from both ends, on running counts: Artigues, Hebrard,
   * Mayer-Eichberger, Siala &amp; Walsh (2014), "SAT and Hybrid Models of the Car Sequencing
   * Problem", CPAIOR, LNCS 8451:268-283.
   */
  static void runningBounds(GlazeLine line, Change change) {
    Group group = change.group("as many so far as can be and must be");
    for (int t : line.strictTreatments()) {
      Treatment treatment = line.treatment(t);
      int tiles = line.tilesWith(t);
      if (!line.windows(t).isEmpty()) {
        for (int slots = 1; slots <= line.slots(); slots++) {
          IntVar soFar = change.variable(WindowForms.soFar(t, slots));
          group.post(soFar.ge(tiles - treatment.mostAmong(line.slots() - slots)));
          group.post(soFar.le(Math.min(tiles, treatment.mostAmong(slots))));
        }
      }
    }
  }
}
