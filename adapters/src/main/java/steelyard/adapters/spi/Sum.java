package steelyard.adapters.spi;

import java.util.LinkedHashMap;
import java.util.Map;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.View;

/** A linear sum in the making: terms over one variable are collected. */
final class Sum {
  private final Map<Integer, Long> coefficients = new LinkedHashMap<>();
  private long constant;

  /** Adds {@code factor·view}. */
  Sum add(long factor, View view) {
    constant = Math.addExact(constant, Math.multiplyExact(factor, view.offset()));
    if (!view.isConstant()) {
      coefficients.merge(view.variable(), factor * view.sign(), Math::addExact);
    }
    return this;
  }

  /** Adds {@code factor} times {@code other}. */
  Sum add(long factor, Sum other) {
    constant = Math.addExact(constant, Math.multiplyExact(factor, other.constant));
    other.coefficients.forEach((v, a) -> coefficients.merge(v, factor * a, Math::addExact));
    return this;
  }

  LinearSum toLinearSum() {
    coefficients.values().removeIf(a -> a == 0);
    int[] variables = coefficients.keySet().stream().mapToInt(v -> v).toArray();
    long[] factors = coefficients.values().stream().mapToLong(a -> a).toArray();
    return new LinearSum(Ints.of(variables), Longs.of(factors), constant);
  }
}
