package steelyard.adapters.sat.encoding;

import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.View;

/**
 * For each bin, the sizes of the items in it sum to its load: Shaw (2004), "A Constraint for Bin
 * Packing", CP, LNCS 3258:648-662, section 2.
 */
final class BinPackingEncoder {
  static final String NAME = "weighted sum per bin (Shaw 2004)";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  BinPackingEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  void encode(BinPacking relation) {
    for (int i = 0; i < relation.bins().size(); i++) {
      View bin = relation.bins().get(i);
      cnf.clause(integers.atLeast(bin, 0));
      cnf.clause(integers.atMost(bin, relation.loads().size() - 1L));
    }
    for (int b = 0; b < relation.loads().size(); b++) {
      LinearEncoder.Sum sum = linear.sum().add(relation.loads().get(b), -1);
      for (int i = 0; i < relation.bins().size(); i++) {
        if (relation.sizes().get(i) > 0) {
          sum.addWhere(integers.is(relation.bins().get(i), b), relation.sizes().get(i));
        }
      }
      linear.encode(sum, Comparison.EQ, 0, Cnf.TRUE);
    }
  }
}
