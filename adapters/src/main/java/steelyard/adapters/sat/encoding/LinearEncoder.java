package steelyard.adapters.sat.encoding;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedSet;
import java.util.TreeSet;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.View;

/**
 * Linear relations: those of literals of one weight by counting, small ones by a decision diagram,
 * the others by binary adders. A guard makes each conditional: where it is false nothing is said.
 */
final class LinearEncoder {
  /** Clauses over equality literals, one for each pair of values that may not meet. */
  static final String CONFLICTS = "conflict clauses (Walsh 2000)";

  /** What one clause, or some of one literal, says. */
  static final String CLAUSES = "clauses";

  private final Cnf cnf;
  private final Integers integers;
  private final Cardinality cardinality;
  private final long mostEdges;
  private final SortedSet<String> used = new TreeSet<>();

  /**
   * An encoder.
   *
   * @param mostEdges a decision diagram of more edges is replaced by binary adders
   */
  LinearEncoder(Cnf cnf, Integers integers, long mostEdges) {
    this.cnf = cnf;
    this.integers = integers;
    this.cardinality = new Cardinality(cnf);
    this.mostEdges = mostEdges;
  }

  /** The names of the encodings used since the last call. */
  SortedSet<String> used() {
    SortedSet<String> names = new TreeSet<>(used);
    used.clear();
    return names;
  }

  /** The relation holds where {@code guard} does. */
  void encode(Linear relation, int guard) {
    LinearSum sum = relation.sum();
    if (relation.op() == Comparison.NE && sum.size() == 2) {
      differ(sum, relation.bound(), guard);
    } else {
      Sum terms = new Sum();
      for (int i = 0; i < sum.size(); i++) {
        terms.add(sum.variable(i), sum.coefficient(i));
      }
      encode(terms, relation.op(), relation.bound(), guard);
    }
  }

  /** The relation does not hold where {@code guard} does. */
  void encodeNegated(Linear relation, int guard) {
    long bound = relation.bound();
    encode(
        switch (relation.op()) {
          case LE -> Linear.of(relation.sum(), Comparison.GE, bound + 1);
          case GE -> Linear.of(relation.sum(), Comparison.LE, bound - 1);
          case EQ -> Linear.of(relation.sum(), Comparison.NE, bound);
          case NE -> Linear.of(relation.sum(), Comparison.EQ, bound);
        },
        guard);
  }

  /** A sum in the making, over variables and literals. */
  final class Sum {
    private final List<Ladder> ladders = new ArrayList<>();
    private long constant;

    /** Adds {@code factor·view}. */
    Sum add(View view, long factor) {
      constant += factor * view.offset();
      return view.isConstant() ? this : add(view.variable(), factor * view.sign());
    }

    /** Adds {@code coefficient·x}. */
    Sum add(int variable, long coefficient) {
      int last = integers.size(variable) - 1;
      constant += coefficient * integers.valueAt(variable, coefficient > 0 ? 0 : last);
      if (last > 0) {
        ladders.add(Ladder.of(integers, variable, coefficient));
      }
      return this;
    }

    /** Adds {@code weight} where {@code literal} is true; the weight is positive. */
    Sum addWhere(int literal, long weight) {
      if (literal == Cnf.TRUE) {
        constant += weight;
      } else if (literal != Cnf.FALSE) {
        ladders.add(Ladder.of(literal, weight));
      }
      return this;
    }
  }

  Sum sum() {
    return new Sum();
  }

  /** {@code a ≤ b}, where {@code guard} holds. */
  void order(View a, View b, int guard) {
    encode(sum().add(a, 1).add(b, -1), Comparison.LE, 0, guard);
  }

  /** {@code sum OP bound}, where {@code guard} holds. */
  void encode(Sum sum, Comparison op, long bound, int guard) {
    long left = bound - sum.constant;
    switch (op) {
      case LE -> atMost(sum.ladders, left, guard);
      case GE -> atLeast(sum.ladders, left, guard);
      case EQ -> equal(sum.ladders, left, guard);
      case NE -> notEqual(sum.ladders, left, guard);
    }
  }

  private void atLeast(List<Ladder> terms, long bound, int guard) {
    atMost(terms.stream().map(Ladder::reversed).toList(), top(terms) - bound, guard);
  }

  private void atMost(List<Ladder> terms, long bound, int guard) {
    if (bound < 0) {
      cnf.clause(-guard);
    } else if (bound < top(terms)) {
      ofOneWeight(terms)
          .ifPresentOrElse(
              literals -> count(literals, bound / terms.get(0).top(), guard),
              () -> weigh(terms, bound, guard));
    }
  }

  /** At most so many of the literals, fewer than there are. */
  private void count(Literals literals, long most, int guard) {
    if (most == 0) {
      used.add(CLAUSES);
      for (int i = 0; i < literals.size(); i++) {
        cnf.clause(-guard, -literals.get(i));
      }
    } else if (most == literals.size() - 1) {
      used.add(CLAUSES);
      cnf.or(-guard).orAny(literals.negated()).end();
    } else {
      used.add(cardinality.atMost(literals, most, guard));
    }
  }

  private void weigh(List<Ladder> terms, long bound, int guard) {
    diagram(terms, bound)
        .ifPresentOrElse(
            diagram -> {
              used.add(terms.size() > 2 ? DecisionDiagram.NAME : DecisionDiagram.TWO_TERMS);
              diagram.encode(cnf, guard);
            },
            () -> binary(terms).atMost(bound, guard));
  }

  private Optional<DecisionDiagram> diagram(List<Ladder> terms, long bound) {
    return DecisionDiagram.of(terms, bound, terms.size() > 2 ? mostEdges : Long.MAX_VALUE);
  }

  private void equal(List<Ladder> terms, long bound, int guard) {
    if (bound < 0 || bound > top(terms)) {
      cnf.clause(-guard);
      return;
    }
    Optional<Literals> counted = ofOneWeight(terms);
    if (counted.isPresent()) {
      countExactly(counted.get(), bound, terms.get(0).top(), guard);
    } else if (isSmall(terms, bound)) {
      atMost(terms, bound, guard);
      atLeast(terms, bound, guard);
    } else {
      BinarySum sum = binary(terms);
      sum.atMost(bound, guard);
      sum.atLeast(bound, guard);
    }
  }

  private void countExactly(Literals literals, long bound, long weight, int guard) {
    long count = bound / weight;
    if (bound % weight != 0) {
      cnf.clause(-guard);
    } else if (count <= 1) {
      count(literals, count, guard);
      count(literals.negated(), literals.size() - count, guard);
    } else if (count >= literals.size() - 1) {
      countExactly(literals.negated(), (literals.size() - count) * weight, weight, guard);
    } else {
      used.add(Cardinality.TOTALIZER);
      cardinality.exactly(literals, (int) count, guard);
    }
  }

  private void notEqual(List<Ladder> terms, long bound, int guard) {
    if (bound < 0 || bound > top(terms)) {
      return;
    }
    if (isSmall(terms, bound)) {
      int below = cnf.variable();
      int above = cnf.variable();
      cnf.clause(-guard, below, above);
      atMost(terms, bound - 1, below);
      atLeast(terms, bound + 1, above);
    } else {
      binary(terms).differs(bound, guard);
    }
  }

  /** {@code a·x + b·y ≠ bound}: no value of x meets the one of y that would make it true. */
  private void differ(LinearSum sum, long bound, int guard) {
    used.add(CONFLICTS);
    int least = integers.size(sum.variable(0)) <= integers.size(sum.variable(1)) ? 0 : 1;
    int x = sum.variable(least);
    int y = sum.variable(1 - least);
    long a = sum.coefficient(least);
    long b = sum.coefficient(1 - least);
    for (int i = 0; i < integers.size(x); i++) {
      long rest = bound - a * integers.valueAt(x, i);
      if (rest % b == 0) {
        int met = integers.is(y, rest / b);
        if (met != Cnf.FALSE) {
          cnf.clause(-guard, -integers.is(x, integers.valueAt(x, i)), -met);
        }
      }
    }
  }

  private boolean isSmall(List<Ladder> terms, long bound) {
    return terms.size() <= 2 || ofOneWeight(terms).isPresent() || diagram(terms, bound).isPresent();
  }

  private BinarySum binary(List<Ladder> terms) {
    used.add(BinarySum.NAME);
    return new BinarySum(cnf, terms);
  }

  /** The literals, if every term has two values and all have the same weight. */
  private static Optional<Literals> ofOneWeight(List<Ladder> terms) {
    Literals literals = new Literals(terms.size());
    for (Ladder term : terms) {
      if (term.size() != 2 || term.top() != terms.get(0).top()) {
        return Optional.empty();
      }
      literals.add(term.literal(1));
    }
    return terms.isEmpty() ? Optional.empty() : Optional.of(literals);
  }

  private static long top(List<Ladder> terms) {
    return terms.stream().mapToLong(Ladder::top).sum();
  }
}
