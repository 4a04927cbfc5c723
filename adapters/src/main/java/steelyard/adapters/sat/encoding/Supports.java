package steelyard.adapters.sat.encoding;

import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.View;

/**
 * What a view's values need: a value with supports one of them, any other value one of the rest.
 */
final class Supports {
  private final SortedMap<Integer, Literals> byValue = new TreeMap<>();
  private final Literals elsewhere = new Literals();

  /** {@code literal} supports {@code value}. */
  void add(int value, int literal) {
    byValue.computeIfAbsent(value, v -> new Literals()).add(literal);
  }

  /** {@code literal} supports every value. */
  void addEverywhere(int literal) {
    elsewhere.add(literal);
  }

  /** One clause for each value with supports, and one for each gap between such values. */
  void encode(Cnf cnf, Integers integers, View view) {
    int below = Cnf.FALSE;
    for (int value : byValue.keySet()) {
      gap(cnf, below, integers.atLeast(view, value));
      below = integers.atMost(view, value);
    }
    gap(cnf, below, Cnf.FALSE);
    byValue.forEach(
        (value, supports) ->
            cnf.or(-integers.is(view, value)).orAny(elsewhere).orAny(supports).end());
  }

  private void gap(Cnf cnf, int below, int above) {
    if (below != -above) {
      cnf.or(below).or(above).orAny(elsewhere).end();
    }
  }
}
