package steelyard.adapters.sat.encoding;

import steelyard.variants.model.Comparison;
import steelyard.variants.model.Element;
import steelyard.variants.model.View;

/**
 * Each index implies that its entry is the result; over constants each value of the result also
 * needs an index that gives it, which makes unit propagation domain consistent: the support
 * encoding of Gent (2002), "Arc Consistency in SAT", ECAI, 121-125.
 */
final class ElementEncoder {
  static final String NAME = "implication per index, support per value (Gent 2002)";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  ElementEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  void encode(Element relation) {
    View index = relation.index();
    cnf.clause(integers.atLeast(index, 0));
    cnf.clause(integers.atMost(index, relation.array().size() - 1L));
    Supports supports = new Supports();
    for (int i = 0; i < relation.array().size(); i++) {
      int chosen = integers.is(index, i);
      View entry = relation.array().get(i);
      if (chosen != Cnf.FALSE) {
        implies(chosen, entry, relation.result());
        if (entry.isConstant()) {
          supports.add(entry.offset(), chosen);
        } else {
          supports.addEverywhere(chosen);
        }
      }
    }
    supports.encode(cnf, integers, relation.result());
  }

  private void implies(int chosen, View entry, View result) {
    if (entry.isConstant()) {
      cnf.clause(-chosen, integers.is(result, entry.offset()));
    } else {
      linear.encode(linear.sum().add(entry, 1).add(result, -1), Comparison.EQ, 0, chosen);
    }
  }
}
