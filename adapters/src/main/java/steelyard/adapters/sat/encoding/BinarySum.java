package steelyard.adapters.sat.encoding;

import java.util.ArrayList;
import java.util.List;

/**
 * The value of a sum as a binary number, by a network of full and half adders; compact where a
 * decision diagram would be too large, and weak in propagation.
 *
 * <p>Source: Warners (1998), "A Linear-Time Transformation of Linear Inequalities into Conjunctive
 * Normal Form", Information Processing Letters 68(2):63-69; the network after Eén &amp; Sörensson
 * (2006), "Translating Pseudo-Boolean Constraints into SAT", JSAT 2:1-26, section 5.2.
 */
final class BinarySum {
  static final String NAME = "binary adders (Warners 1998; Eén & Sörensson 2006)";

  private final Cnf cnf;

  /** By power of two: the literals still to be added there, in the order in which they came. */
  private final List<Literals> columns = new ArrayList<>();

  /** The number's bits, the lowest first. */
  private final Literals bits = new Literals();

  BinarySum(Cnf cnf, List<Ladder> terms) {
    this.cnf = cnf;
    terms.forEach(this::spread);
    for (int power = 0; power < columns.size(); power++) {
      bits.add(reduced(power));
    }
  }

  /** The sum is at most {@code bound}, where {@code guard} holds. */
  void atMost(long bound, int guard) {
    for (int i = 0; i < bits.size(); i++) {
      if (!isOne(bound, i)) {
        cnf.or(-guard).or(-bits.get(i));
        for (int j = i + 1; j < bits.size(); j++) {
          cnf.or(isOne(bound, j) ? -bits.get(j) : Cnf.FALSE);
        }
        cnf.end();
      }
    }
  }

  /** The sum is at least {@code bound}, where {@code guard} holds. */
  void atLeast(long bound, int guard) {
    for (int i = 0; i < bits.size(); i++) {
      if (isOne(bound, i)) {
        cnf.or(-guard).or(bits.get(i));
        for (int j = i + 1; j < bits.size(); j++) {
          cnf.or(isOne(bound, j) ? Cnf.FALSE : bits.get(j));
        }
        cnf.end();
      }
    }
  }

  /** The sum is not {@code value}, where {@code guard} holds. */
  void differs(long value, int guard) {
    cnf.or(-guard);
    for (int i = 0; i < bits.size(); i++) {
      cnf.or(isOne(value, i) ? -bits.get(i) : bits.get(i));
    }
    cnf.end();
  }

  private static boolean isOne(long number, int power) {
    return (number >> power & 1) == 1;
  }

  /** Puts a term's bits where its weight says. */
  private void spread(Ladder term) {
    long weight = 0;
    for (int i = 1; i < term.size(); i++) {
      weight = gcd(term.value(i), weight);
    }
    long top = term.top() / weight;
    for (int bit = 0; top >> bit != 0; bit++) {
      int literal = bit(term, weight, bit);
      for (int power = 0; weight >> power != 0; power++) {
        if (isOne(weight, power)) {
          column(bit + power).add(literal);
        }
      }
    }
  }

  private static long gcd(long a, long b) {
    return b == 0 ? a : gcd(b, a % b);
  }

  private Literals column(int power) {
    while (columns.size() <= power) {
      columns.add(new Literals());
    }
    return columns.get(power);
  }

  /** The literal of one bit of {@code term / weight}: constant between neighbouring changes. */
  private int bit(Ladder term, long weight, int bit) {
    if (term.size() == 2) {
      return isOne(term.top() / weight, bit) ? term.literal(1) : Cnf.FALSE;
    }
    int literal = cnf.variable();
    int from = 0;
    for (int i = 1; i <= term.size(); i++) {
      boolean one = isOne(term.value(from) / weight, bit);
      if (i == term.size() || isOne(term.value(i) / weight, bit) != one) {
        int above = i == term.size() ? Cnf.FALSE : term.literal(i);
        cnf.clause(-term.literal(from), above, one ? literal : -literal);
        from = i;
      }
    }
    return literal;
  }

  /** Adds up a column, carrying to the next; the literal that remains. */
  private int reduced(int power) {
    Literals column = column(power);
    int next = 0;
    while (column.size() - next > 1) {
      int a = column.get(next++);
      int b = column.get(next++);
      if (next < column.size()) {
        fullAdder(a, b, column.get(next++), power);
      } else {
        halfAdder(a, b, power);
      }
    }
    return column.isEmpty() ? Cnf.FALSE : column.get(next);
  }

  private void fullAdder(int a, int b, int c, int power) {
    int sum = cnf.variable();
    int carry = cnf.variable();
    for (int signs = 0; signs < 8; signs++) {
      int x = (signs & 1) == 0 ? a : -a;
      int y = (signs & 2) == 0 ? b : -b;
      int z = (signs & 4) == 0 ? c : -c;
      cnf.clause(x, y, z, Integer.bitCount(signs) % 2 == 0 ? -sum : sum);
    }
    majority(a, b, c, carry);
    majority(-a, -b, -c, -carry);
    column(power).add(sum);
    column(power + 1).add(carry);
  }

  /** Two of the literals imply {@code majority}. */
  private void majority(int a, int b, int c, int majority) {
    cnf.clause(-a, -b, majority);
    cnf.clause(-a, -c, majority);
    cnf.clause(-b, -c, majority);
  }

  private void halfAdder(int a, int b, int power) {
    int sum = cnf.variable();
    int carry = cnf.variable();
    cnf.clause(a, b, -sum);
    cnf.clause(-a, -b, -sum);
    cnf.clause(a, -b, sum);
    cnf.clause(-a, b, sum);
    cnf.clause(-carry, a);
    cnf.clause(-carry, b);
    cnf.clause(carry, -a, -b);
    column(power).add(sum);
    column(power + 1).add(carry);
  }
}
