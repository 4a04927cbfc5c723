package steelyard.variants.model.build;

import java.util.LinkedHashMap;
import java.util.Map;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Viewable;

/** Collects a linear sum: like variables are joined, zeros drop out, order of first use stays. */
final class SumBuilder {
  private final Map<Integer, Long> coefficients = new LinkedHashMap<>();
  private long constant;

  void add(long factor, View view) {
    addConstant(Math.multiplyExact(factor, (long) view.offset()));
    if (!view.isConstant()) {
      coefficients.merge(
          view.variable(), Math.multiplyExact(factor, (long) view.sign()), Math::addExact);
    }
  }

  /** Adds a term that is a sum of variables. */
  void add(long factor, Term linear) {
    if (linear instanceof Term.Constant number) {
      addConstant(Math.multiplyExact(factor, number.value()));
    } else if (linear instanceof Term.Sum parts) {
      for (int i = 0; i < parts.terms().size(); i++) {
        add(Math.multiplyExact(factor, parts.coefficients().get(i)), parts.terms().get(i));
      }
    } else {
      add(factor, ((Viewable) linear).view());
    }
  }

  void addConstant(long value) {
    constant = Math.addExact(constant, value);
  }

  LinearSum build() {
    coefficients.values().removeIf(a -> a == 0);
    return new LinearSum(
        Ints.of(coefficients.keySet().stream().mapToInt(Integer::intValue).toArray()),
        Longs.of(coefficients.values().stream().mapToLong(Long::longValue).toArray()),
        constant);
  }
}
