package steelyard.adapters.cpsat;

import static steelyard.adapters.cpsat.ModelProto.negated;

import com.google.ortools.sat.LinearConstraintProto;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.function.ObjIntConsumer;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;

/**
 * One Boolean per atom and its negation, shared by all who ask. A variable 0..1 is its own literal;
 * any other atom gets a fresh Boolean b with {@code b => atom} and {@code not b => not atom}, so
 * that it takes no part in counting solutions.
 */
final class Literals {
  private final ModelProto proto;
  private final Places places;
  private final Map<Atom, Integer> made = new LinkedHashMap<>();

  Literals(ModelProto proto, Places places) {
    this.proto = proto;
    this.places = places;
  }

  /**
   * The one atom that stands for all that are equal to {@code atom} on its variable's domain: a
   * constant, [x >= v] or [x = v] with v in the domain, or the negation of one of these.
   */
  Atom canonical(Atom atom) {
    if (atom.isConstant()) {
      return atom;
    }
    Domain domain = places.domain(atom.variable());
    return switch (atom.op()) {
      case GE -> atLeast(atom, domain);
      case LE -> atLeast(atom.negated(), domain).negated();
      case EQ -> equal(atom, domain);
      case NE -> equal(atom.negated(), domain).negated();
    };
  }

  private static Atom atLeast(Atom atom, Domain domain) {
    if (atom.value() <= domain.min()) {
      return Atom.TRUE;
    }
    return atom.value() > domain.max()
        ? Atom.FALSE
        : Atom.atLeast(atom.variable(), ceiling(domain, atom.value()));
  }

  private static Atom equal(Atom atom, Domain domain) {
    if (!domain.contains(atom.value())) {
      return Atom.FALSE;
    }
    if (atom.value() == domain.max()) {
      return atLeast(Atom.atLeast(atom.variable(), atom.value()), domain);
    }
    return atom.value() == domain.min()
        ? atLeast(Atom.atLeast(atom.variable(), atom.value() + 1), domain).negated()
        : atom;
  }

  /** The smallest value of {@code domain} that is not below {@code value}, which is in its hull. */
  private static int ceiling(Domain domain, int value) {
    int low = 0;
    int high = domain.ranges() - 1;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (domain.to(middle) < value) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return Math.max(value, domain.from(low));
  }

  /** Whether {@link #of} would make nothing new for this canonical atom. */
  boolean has(Atom canonical) {
    return isBoolean(canonical) || made.containsKey(positive(canonical));
  }

  /** The literal of a canonical atom that is no constant. */
  int of(Atom canonical) {
    Atom positive = positive(canonical);
    int literal =
        isBoolean(positive)
            ? places.of(positive.variable())
            : made.computeIfAbsent(positive, this::make);
    return positive.equals(canonical) ? literal : negated(literal);
  }

  private boolean isBoolean(Atom canonical) {
    return places.domain(canonical.variable()).equals(Domain.BOOLEAN);
  }

  private static Atom positive(Atom canonical) {
    return switch (canonical.op()) {
      case GE, EQ -> canonical;
      case LE, NE -> canonical.negated();
    };
  }

  private int make(Atom atom) {
    int literal = proto.bool();
    imply(atom, literal);
    imply(atom.negated(), negated(literal));
    return literal;
  }

  /** States the atom wherever all of {@code enforcement} are true, without a Boolean for it. */
  void imply(Atom atom, int... enforcement) {
    LinearConstraintProto.Builder variable =
        LinearConstraintProto.newBuilder().addVars(places.of(atom.variable())).addCoeffs(1);
    Comparison op =
        switch (atom.op()) {
          case GE -> Comparison.GE;
          case LE -> Comparison.LE;
          case EQ -> Comparison.EQ;
          case NE -> Comparison.NE;
        };
    proto.linear(variable, op, atom.value(), enforcement);
  }

  /** Every atom that got a Boolean of its own, in order of making. */
  void forEachMade(ObjIntConsumer<Atom> action) {
    made.forEach(action::accept);
  }
}
