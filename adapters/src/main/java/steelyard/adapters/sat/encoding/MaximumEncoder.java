package steelyard.adapters.sat.encoding;

import steelyard.variants.model.Maximum;
import steelyard.variants.model.View;

/** By order literals: the result reaches what any term reaches, and only what one of them does. */
final class MaximumEncoder {
  static final String NAME = "order literals per value";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  MaximumEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  void encode(Maximum relation) {
    View result = relation.result();
    relation.terms().stream().forEach(term -> linear.order(term, result, Cnf.TRUE));
    integers.forEachValue(
        result,
        value -> {
          cnf.or(-integers.atLeast(result, value));
          relation.terms().stream().forEach(term -> cnf.or(integers.atLeast(term, value)));
          cnf.end();
        });
  }
}
