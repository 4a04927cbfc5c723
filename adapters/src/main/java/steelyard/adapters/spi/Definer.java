package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Ints;
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
    return literal(Linear.of(sum, op, bound));
  }

  /** The literal of a linear relation. */
  Atom literal(Linear relation) {
    return known(relation).orElseGet(() -> named(relation));
  }

  /** The literal of a linear relation if it needs no new Boolean. */
  Optional<Atom> known(Linear relation) {
    LinearSum sum = relation.sum();
    if (sum.size() == 1) {
      Atom atom = single(sum.variable(0), sum.coefficient(0), relation.op(), relation.bound());
      return Optional.of(settled(atom));
    }
    return decided(relation).map(Atom::constant);
  }

  /** The literal that says every one of {@code atoms} holds. */
  Atom all(Collection<Atom> atoms) {
    return any(atoms.stream().map(Atom::negated).toList()).negated();
  }

  /** The literal that says one of {@code atoms} holds. */
  Atom any(Collection<Atom> atoms) {
    List<Atom> open = open(atoms);
    return switch (open.size()) {
      case 0 -> Atom.FALSE;
      case 1 -> open.get(0);
      default -> named(new Clause(Atoms.of(open)));
    };
  }

  /** The literal that says the view has one of {@code values}. */
  Atom oneOf(View view, Ints values) {
    List<Atom> runs = new ArrayList<>();
    int[] sorted = values.stream().filter(v -> mayBe(view.is(v))).sorted().toArray();
    for (int from = 0, to; from < sorted.length; from = to + 1) {
      to = from;
      while (to + 1 < sorted.length && sorted[to + 1] == sorted[to] + 1) {
        to++;
      }
      runs.add(
          from == to
              ? view.is(sorted[from])
              : all(List.of(view.atLeast(sorted[from]), view.atMost(sorted[to]))));
    }
    return any(runs);
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

  /** Adds {@code factor·view} to {@code sum} where {@code when} holds, and nothing elsewhere. */
  void addWhere(Atom when, long factor, View view, Sum sum) {
    View bit = counted(when);
    if (bit.isConstant()) {
      if (bit.offset() == 1) {
        sum.add(factor, view);
      }
      return;
    }
    sum.add(factor * view.offset(), bit);
    if (!view.isConstant()) {
      View variable = View.of(view.variable());
      Domain domain = Domains.with(0, fresh.domain(view.variable()));
      sum.add(factor * view.sign(), choice(bit, variable, View.constant(0), domain));
    }
  }

  /** A new variable that is {@code then} where {@code bit} is 1, else {@code otherwise}. */
  View choice(View bit, View then, View otherwise, Domain domain) {
    return entry(Views.of(otherwise, then), bit, domain);
  }

  /** A new variable that is {@code array[index]}; the index cannot leave the array. */
  View entry(Views array, View index, Domain domain) {
    return defined(domain, own -> new Element(array, index, own));
  }

  /** A new variable with the total definition that {@code constraint} makes for it. */
  View defined(Domain domain, Function<View, Constraint> constraint) {
    int variable = fresh.variable(domain);
    View own = View.of(variable);
    definitions.add(new Definition(variable, constraint.apply(own)));
    return own;
  }

  /** The values that {@code view} can take. */
  Domain domain(View view) {
    return view.isConstant()
        ? Domain.of(view.offset())
        : Domains.of(view, fresh.domain(view.variable()));
  }

  long min(View view) {
    return switch (view.sign()) {
      case 1 -> (long) fresh.domain(view.variable()).min() + view.offset();
      case -1 -> (long) view.offset() - fresh.domain(view.variable()).max();
      default -> view.offset();
    };
  }

  long max(View view) {
    return -min(view.negated());
  }

  /** A literal of a new Boolean that is true exactly where {@code relation} holds. */
  private Atom named(Relation relation) {
    return named.computeIfAbsent(
        relation,
        r ->
            defined(Domain.BOOLEAN, own -> new Conditional(own.atLeast(1), Conditional.Mode.IFF, r))
                .atLeast(1));
  }

  /** The distinct atoms that domains leave open; TRUE alone where one of them is true. */
  List<Atom> open(Collection<Atom> atoms) {
    Set<Atom> open = new LinkedHashSet<>();
    for (Atom atom : atoms) {
      Atom settled = settled(atom);
      if (settled.equals(Atom.TRUE)) {
        return List.of(Atom.TRUE);
      }
      if (!settled.isConstant()) {
        open.add(settled);
      }
    }
    return List.copyOf(open);
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
