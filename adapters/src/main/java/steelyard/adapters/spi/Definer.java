package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Relation;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;

/**
 * Gives conditions a literal. One that domains decide is a constant, one over a single variable is
 * a literal of it, and only another needs a new Boolean and its total definition.
 */
final class Definer {
  private final Fresh fresh;
  private final List<Definition> definitions = new ArrayList<>();
  private final Map<Relation, Atom> named = new HashMap<>();

  Definer(Fresh fresh) {
    this.fresh = fresh;
  }

  List<Definition> definitions() {
    return definitions;
  }

  /** The literal of {@code a OP b}. */
  Atom compare(View a, Comparison op, View b) {
    return holds(new Sum().add(1, a).add(-1, b).toLinearSum(), op, 0);
  }

  /** The literal of {@code sum OP bound}. */
  Atom holds(LinearSum sum, Comparison op, long bound) {
    Linear relation = Linear.of(sum, op, bound);
    if (sum.size() == 1) {
      return settled(single(sum.variable(0), sum.coefficient(0), op, relation.bound()));
    }
    return decided(relation).map(Atom::constant).orElseGet(() -> named(relation));
  }

  /** The literal that says every one of {@code atoms} holds. */
  Atom all(Collection<Atom> atoms) {
    return any(atoms.stream().map(Atom::negated).toList()).negated();
  }

  /** The literal that says one of {@code atoms} holds. */
  Atom any(Collection<Atom> atoms) {
    Set<Atom> open = open(atoms);
    return switch (open.size()) {
      case 0 -> Atom.FALSE;
      case 1 -> open.iterator().next();
      default -> named(new Clause(Atoms.of(open)));
    };
  }

  /** The clause without what domains decide; empty where they make it true. */
  Optional<Clause> clause(Collection<Atom> atoms) {
    Set<Atom> open = open(atoms);
    return open.contains(Atom.TRUE) ? Optional.empty() : Optional.of(new Clause(Atoms.of(open)));
  }

  /** Whether the domain of the atom's variable leaves it open or true. */
  boolean mayBe(Atom atom) {
    return !settled(atom).equals(Atom.FALSE);
  }

  /** A view of values 0 and 1 that is 1 where {@code atom} holds, for use in sums. */
  View counted(Atom atom) {
    Atom settled = settled(atom);
    if (settled.isConstant()) {
      return View.constant(settled.equals(Atom.TRUE) ? 1 : 0);
    }
    int variable = settled.variable();
    if (fresh.domain(variable).equals(Domain.BOOLEAN)) {
      View bit = View.of(variable);
      return settled.holds(1) ? bit : bit.negated().shifted(1);
    }
    Atom bit = named(new Clause(Atoms.of(settled)));
    return View.of(bit.variable());
  }

  /** Adds {@code view} to {@code sum} where {@code when} holds, and nothing elsewhere. */
  void addWhere(Atom when, View view, Sum sum) {
    View bit = counted(when);
    if (bit.isConstant()) {
      if (bit.offset() == 1) {
        sum.add(1, view);
      }
      return;
    }
    sum.add(view.offset(), bit);
    if (!view.isConstant()) {
      sum.add(view.sign(), View.of(chosen(bit, view.variable())));
    }
  }

  /** A new variable that is {@code variable} where {@code bit} is 1, and 0 elsewhere. */
  private int chosen(View bit, int variable) {
    int chosen = fresh.variable(withZero(fresh.domain(variable)));
    Views array = Views.of(View.constant(0), View.of(variable));
    definitions.add(new Definition(chosen, new Element(array, bit, View.of(chosen))));
    return chosen;
  }

  private static Domain withZero(Domain domain) {
    if (domain.contains(0)) {
      return domain;
    }
    int below = (int) IntStream.range(0, domain.ranges()).filter(r -> domain.to(r) < 0).count();
    int[] bounds = new int[2 * domain.ranges() + 2];
    for (int r = 0; r < domain.ranges(); r++) {
      int at = 2 * (r < below ? r : r + 1);
      bounds[at] = domain.from(r);
      bounds[at + 1] = domain.to(r);
    }
    return Domain.ofRanges(bounds);
  }

  /** A literal of a new Boolean that is true exactly where {@code relation} holds. */
  private Atom named(Relation relation) {
    return named.computeIfAbsent(
        relation,
        r -> {
          int bit = fresh.variable(Domain.BOOLEAN);
          Atom holds = Atom.atLeast(bit, 1);
          definitions.add(new Definition(bit, new Conditional(holds, Conditional.Mode.IFF, r)));
          return holds;
        });
  }

  /** The distinct atoms that domains leave open; TRUE alone where one of them is true. */
  private Set<Atom> open(Collection<Atom> atoms) {
    Set<Atom> open = new LinkedHashSet<>();
    for (Atom atom : atoms) {
      Atom settled = settled(atom);
      if (settled.equals(Atom.TRUE)) {
        return Set.of(Atom.TRUE);
      }
      if (!settled.isConstant()) {
        open.add(settled);
      }
    }
    return open;
  }

  /** The atom, or a constant where the variable's domain decides it. */
  private Atom settled(Atom atom) {
    if (atom.isConstant()) {
      return atom;
    }
    Domain domain = fresh.domain(atom.variable());
    int v = atom.value();
    return switch (atom.op()) {
      case GE -> v <= domain.min() ? Atom.TRUE : v > domain.max() ? Atom.FALSE : atom;
      case LE -> v >= domain.max() ? Atom.TRUE : v < domain.min() ? Atom.FALSE : atom;
      case EQ -> !domain.contains(v) ? Atom.FALSE : domain.isFixed() ? Atom.TRUE : atom;
      case NE -> !domain.contains(v) ? Atom.TRUE : domain.isFixed() ? Atom.FALSE : atom;
    };
  }

  /** What the ranges of its variables say of the relation. */
  private Optional<Boolean> decided(Linear relation) {
    LinearSum sum = relation.sum();
    long min = 0;
    long max = 0;
    for (int i = 0; i < sum.size(); i++) {
      Domain domain = fresh.domain(sum.variable(i));
      long a = sum.coefficient(i);
      min += a * (a > 0 ? domain.min() : domain.max());
      max += a * (a > 0 ? domain.max() : domain.min());
    }
    long bound = relation.bound();
    if (min == max) {
      return Optional.of(relation.op().holds(min, bound));
    }
    return switch (relation.op()) {
      case LE -> max <= bound ? Optional.of(true) : falseIf(min > bound);
      case GE -> min >= bound ? Optional.of(true) : falseIf(max < bound);
      case EQ -> falseIf(min > bound || max < bound);
      case NE -> min > bound || max < bound ? Optional.of(true) : Optional.empty();
    };
  }

  private static Optional<Boolean> falseIf(boolean condition) {
    return condition ? Optional.of(false) : Optional.empty();
  }

  /** {@code a·x OP bound} as a literal of x. */
  private static Atom single(int variable, long a, Comparison op, long bound) {
    View x = View.of(variable);
    long below = Math.floorDiv(bound, a);
    long above = -Math.floorDiv(-bound, a);
    return switch (op) {
      case LE -> a > 0 ? x.atMost(below) : x.atLeast(above);
      case GE -> a > 0 ? x.atLeast(above) : x.atMost(below);
      case EQ -> below == above ? x.is(below) : Atom.FALSE;
      case NE -> below == above ? x.is(below).negated() : Atom.TRUE;
    };
  }
}
