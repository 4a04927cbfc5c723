package steelyard.variants.model.build;

import java.util.Optional;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Linear;
import steelyard.variants.model.View;

/** Linear relations over at most one variable, as atoms. */
final class Unary {
  private Unary() {}

  /** The atom that {@code linear} is; empty if it has two variables or more. */
  static Optional<Atom> atom(Linear linear, Pool pool) {
    if (linear.sum().size() > 1) {
      return Optional.empty();
    }
    if (linear.sum().size() == 0) {
      return Optional.of(Atom.constant(linear.op().holds(0, linear.bound())));
    }
    long a = linear.sum().coefficient(0);
    View x = View.of(linear.sum().variable(0));
    long bound = linear.bound();
    return Optional.of(
        simplified(
            switch (linear.op()) {
              case LE -> a > 0 ? x.atMost(Math.floorDiv(bound, a)) : x.atLeast(ceilDiv(bound, a));
              case GE -> a > 0 ? x.atLeast(ceilDiv(bound, a)) : x.atMost(Math.floorDiv(bound, a));
              case EQ -> bound % a == 0 ? x.is(bound / a) : Atom.FALSE;
              case NE -> bound % a == 0 ? x.is(bound / a).negated() : Atom.TRUE;
            },
            pool));
  }

  private static long ceilDiv(long dividend, long divisor) {
    return -Math.floorDiv(-dividend, divisor);
  }

  /** The atom, or the constant that it is on its variable's domain. */
  static Atom simplified(Atom atom, Pool pool) {
    if (atom.isConstant()) {
      return atom;
    }
    Domain domain = pool.domain(atom.variable());
    int v = atom.value();
    return switch (atom.op()) {
      case GE -> v <= domain.min() ? Atom.TRUE : v > domain.max() ? Atom.FALSE : atom;
      case LE -> v >= domain.max() ? Atom.TRUE : v < domain.min() ? Atom.FALSE : atom;
      case EQ -> !domain.contains(v) ? Atom.FALSE : domain.isFixed() ? Atom.TRUE : atom;
      case NE -> !domain.contains(v) ? Atom.TRUE : domain.isFixed() ? Atom.FALSE : atom;
    };
  }
}
