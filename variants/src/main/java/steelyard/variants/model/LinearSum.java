package steelyard.variants.model;

import java.util.Objects;
import java.util.stream.IntStream;

/**
 * Σ coefficients[i]·x[i] + constant over distinct variables with coefficients other than 0.
 *
 * @param variables ids, distinct
 * @param coefficients as many; none 0
 */
public record LinearSum(Ints variables, Longs coefficients, long constant) {
  /** No sum may pass this in magnitude, nor may its negation: 2^62 - 1. */
  public static final long LIMIT = (1L << 62) - 1;

  public LinearSum {
    Objects.requireNonNull(variables, "variables");
    Objects.requireNonNull(coefficients, "coefficients");
    if (variables.size() != coefficients.size()) {
      throw new IllegalArgumentException(
          variables.size() + " variables with " + coefficients.size() + " coefficients");
    }
    if (coefficients.stream().anyMatch(a -> a == 0)) {
      throw new IllegalArgumentException("a coefficient of 0");
    }
    if (variables.stream().distinct().count() != variables.size()) {
      throw new IllegalArgumentException("a variable twice in a sum: " + variables);
    }
  }

  public int size() {
    return variables.size();
  }

  public int variable(int i) {
    return variables.get(i);
  }

  public long coefficient(int i) {
    return coefficients.get(i);
  }

  /** The sum's value; cannot overflow on values of the domains that it was posted over. */
  public long value(Assignment values) {
    long sum = constant;
    for (int i = 0; i < size(); i++) {
      sum += coefficient(i) * values.value(variable(i));
    }
    return sum;
  }

  LinearSum rewrite(Rewriting rewriting) {
    Ints mapped = variables.mapped(rewriting);
    int[] order =
        rewriting.rows(
            size(),
            (i, j) -> {
              int byVariable = Integer.compare(mapped.get(i), mapped.get(j));
              return byVariable != 0 ? byVariable : Long.compare(coefficient(i), coefficient(j));
            });
    return new LinearSum(mapped.permuted(order), coefficients.permuted(order), constant);
  }

  @Override
  public String toString() {
    String terms =
        IntStream.range(0, size())
            .mapToObj(i -> coefficient(i) + "*x" + variable(i))
            .reduce((a, b) -> a + " + " + b)
            .orElse("0");
    return constant == 0 ? terms : terms + " + " + constant;
  }
}
