package steelyard.variants.catalog.glazing;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.Views;

/** The variables of a line's slots, and what is said with them. */
final class Slots {
  private final GlazeLine line;
  private final Function<String, IntVar> byName;

  Slots(GlazeLine line, Function<String, IntVar> byName) {
    this.line = line;
    this.byName = byName;
  }

  IntVar kind(int slot) {
    return byName.apply(Names.kind(slot));
  }

  IntVar needs(int treatment, int slot) {
    return byName.apply(Names.needs(treatment, slot));
  }

  Views kinds(Window window) {
    return Views.of(in(window, this::kind));
  }

  /** The kinds of all slots. */
  Views kinds() {
    return kinds(line());
  }

  /** Whether each tile in the window needs the treatment. */
  List<IntVar> needs(int treatment, Window window) {
    return in(window, slot -> needs(treatment, slot));
  }

  /** Whether each tile needs the treatment. */
  List<IntVar> needs(int treatment) {
    return needs(treatment, line());
  }

  /** How many tiles in the window need the treatment. */
  Term many(int treatment, Window window) {
    return Term.sum(needs(treatment, window));
  }

  /** The windows of the treatment that have too many, as a sum. */
  Term overruns(int treatment) {
    return Term.sum(
        line.windows(treatment).stream()
            .map(window -> byName.apply(Names.over(treatment, window.start())))
            .toList());
  }

  Views glazes() {
    return Views.of(in(line(), slot -> byName.apply(Names.glaze(slot))));
  }

  /** Whether the glaze changes, for each slot but the first. */
  List<IntVar> changes() {
    return changes(new Window(1, line.slots()));
  }

  List<IntVar> changes(Window window) {
    return in(window, slot -> byName.apply(Names.change(slot)));
  }

  /** What is to pay: for windows with too many and for changes of glaze. */
  Term cost() {
    List<Term> costs = new ArrayList<>();
    for (int t : line.pricedTreatments()) {
      costs.add(overruns(t).times(line.treatment(t).excess()));
    }
    if (line.changeCost() > 0) {
      costs.add(Term.sum(changes()).times(line.changeCost()));
    }
    return Term.sum(costs);
  }

  static Formula isTrue(IntVar truth) {
    return Formula.literal(truth.view().atLeast(1));
  }

  private Window line() {
    return new Window(0, line.slots());
  }

  private static List<IntVar> in(Window window, IntFunction<IntVar> variable) {
    return IntStream.range(window.start(), window.end()).mapToObj(variable).toList();
  }
}
