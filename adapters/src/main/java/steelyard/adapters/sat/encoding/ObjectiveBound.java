package steelyard.adapters.sat.encoding;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Objective;

/**
 * An objective as literals by which it is bounded ever more tightly: its possible values are laid
 * out by a totalizer where they are few, else it is a binary number.
 */
public final class ObjectiveBound {
  private final Cnf cnf;

  /** 1 to minimise the sum, -1 to minimise its negative. */
  private final int sign;

  /** The smallest value of what is minimised. */
  private final long least;

  private final Optional<Ladder> values;
  private final Optional<BinarySum> number;

  /**
   * Writes the objective.
   *
   * @param mostClauses a totalizer of more clauses is replaced by a binary number
   */
  ObjectiveBound(Cnf cnf, Integers integers, Objective objective, long mostClauses) {
    this.cnf = cnf;
    this.sign = objective.sense() == Objective.Sense.MINIMIZE ? 1 : -1;
    LinearSum sum = objective.sum();
    List<Ladder> terms = new ArrayList<>();
    long base = sign * sum.constant();
    for (int i = 0; i < sum.size(); i++) {
      long a = sign * sum.coefficient(i);
      int last = integers.size(sum.variable(i)) - 1;
      base += a * integers.valueAt(sum.variable(i), a > 0 ? 0 : last);
      if (last > 0) {
        terms.add(Ladder.of(integers, sum.variable(i), a));
      }
    }
    this.least = base;
    this.values = GeneralizedTotalizer.of(terms, mostClauses).map(t -> t.encode(cnf));
    this.number =
        terms.isEmpty() || values.isPresent()
            ? Optional.empty()
            : Optional.of(new BinarySum(cnf, terms));
  }

  /** What {@code value} costs: 0 is what domains allow at best. */
  public long cost(long value) {
    return sign * value - least;
  }

  /** The objective's value at {@code cost}. */
  public long value(long cost) {
    return sign * (cost + least);
  }

  /** From now on the objective costs at most {@code cost}. */
  public void requireAtMost(long cost) {
    if (cost < 0) {
      cnf.end();
    } else {
      values.ifPresent(ladder -> cnf.clause(ladder.atMost(cost)));
      number.ifPresent(sum -> sum.atMost(cost, Cnf.TRUE));
    }
  }

  /** Whether there is a literal for each cost. */
  public boolean hasLiterals() {
    return values.isPresent();
  }

  /** The literal that says the objective costs at most {@code cost}, which is not negative. */
  public int atMost(long cost) {
    return values.orElseThrow().atMost(cost);
  }

  /** It is known that the objective costs at least {@code cost}, more than 0. */
  public void learnAtLeast(long cost) {
    cnf.clause(-atMost(cost - 1));
  }
}
