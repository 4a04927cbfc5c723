package steelyard.variants.catalog.glazing;

import java.util.stream.IntStream;
import steelyard.variants.model.GlobalCardinality;
import steelyard.variants.model.GlobalCardinality.Others;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/** Another way to say that each kind comes as often as ordered. */
final class DemandForms {
  private DemandForms() {}

  /**
   * One global cardinality constraint over all slots: R&eacute;gin (1996), "Generalized Arc
   * Consistency for Global Cardinality Constraint", AAAI, 209-215.
   */
  static void cardinality(GlazeLine line, Change change) {
    change.withdraw(Names.DEMAND);
    Ints kinds = Ints.of(IntStream.range(0, line.kinds().size()).toArray());
    int[] tiles = line.kinds().stream().mapToInt(Kind::tiles).toArray();
    Views slots = new Slots(line, change::variable).kinds();
    change
        .group(Names.DEMAND)
        .post(new GlobalCardinality(slots, kinds, Views.ofConstants(tiles), Others.FORBIDDEN));
  }
}
