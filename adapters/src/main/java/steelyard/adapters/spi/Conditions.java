package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Relation;
import steelyard.variants.model.View;

/**
 * What must be true for a relation to hold. A linear part gets a literal only in the forms that
 * need one: where it stands alone, or under one condition, it is asserted as it is.
 */
final class Conditions {
  private final Definer definer;
  private final List<Disjunction> all = new ArrayList<>();
  private final List<Relation> also = new ArrayList<>();

  Conditions(Definer definer) {
    this.definer = definer;
  }

  /** One of the atoms or the linear relation; domains leave all of them open. */
  private record Disjunction(List<Atom> atoms, Optional<Linear> linear) {}

  void require(Atom... atoms) {
    require(List.of(atoms));
  }

  /** Some of the atoms is true. */
  void require(Collection<Atom> atoms) {
    add(atoms, Optional.empty());
  }

  /** {@code sum OP bound}, unless one of the atoms is true. */
  void require(LinearSum sum, Comparison op, long bound, Atom... unless) {
    Linear linear = Linear.of(sum, op, bound);
    Optional<Atom> known = definer.known(linear);
    if (known.isPresent()) {
      List<Atom> atoms = new ArrayList<>(List.of(unless));
      atoms.add(known.get());
      require(atoms);
    } else {
      add(List.of(unless), Optional.of(linear));
    }
  }

  /** {@code a OP b}, unless one of the atoms is true. */
  void require(View a, Comparison op, View b, Atom... unless) {
    require(new Sum().add(1, a).add(-1, b).toLinearSum(), op, 0, unless);
  }

  /** The view is one of {@code 0..size-1}. */
  void requireWithin(View view, int size) {
    require(view.atLeast(0));
    require(view.atMost(size - 1L));
  }

  private void add(Collection<Atom> atoms, Optional<Linear> linear) {
    List<Atom> open = definer.open(atoms);
    if (!open.contains(Atom.TRUE)) {
      all.add(new Disjunction(open, linear));
    }
  }

  /** A relation to assert where the conditions are asserted; a truth follows without it. */
  void also(Relation relation) {
    also.add(relation);
  }

  List<Relation> also() {
    return also;
  }

  /** Clauses that are all true exactly where the conditions are. */
  List<Clause> clauses() {
    return all.stream().map(each -> new Clause(Atoms.of(atoms(each)))).toList();
  }

  /** Makes a literal for a linear part. */
  private List<Atom> atoms(Disjunction each) {
    List<Atom> atoms = new ArrayList<>(each.atoms);
    each.linear.ifPresent(linear -> atoms.add(definer.literal(linear)));
    return atoms;
  }

  /** The conditions under {@code when}. */
  List<Constraint> under(Atom when, Conditional.Mode mode) {
    boolean isLinear =
        all.size() == 1 && all.get(0).atoms.isEmpty() && all.get(0).linear.isPresent();
    List<Constraint> asserted = new ArrayList<>();
    if (isLinear) {
      asserted.add(conditional(when, mode, all.get(0).linear.orElseThrow()));
    } else {
      if (mode != Conditional.Mode.IF) {
        onlyIf(when).ifPresent(asserted::add);
      }
      if (mode != Conditional.Mode.ONLY_IF) {
        all.forEach(each -> given(when, each, mode).ifPresent(asserted::add));
      }
    }
    if (mode != Conditional.Mode.ONLY_IF && definer.mayBe(when)) {
      also.forEach(each -> asserted.add(conditional(when, Conditional.Mode.IF, each)));
    }
    return asserted;
  }

  private static Constraint conditional(Atom when, Conditional.Mode mode, Relation relation) {
    return when.equals(Atom.TRUE) && mode != Conditional.Mode.ONLY_IF
        ? relation
        : new Conditional(when, mode, relation);
  }

  private Optional<Clause> onlyIf(Atom when) {
    List<Atom> broken = new ArrayList<>(List.of(when));
    all.forEach(each -> broken.add(definer.any(atoms(each)).negated()));
    return clause(broken);
  }

  private Optional<Constraint> given(Atom when, Disjunction each, Conditional.Mode mode) {
    List<Atom> atoms = new ArrayList<>(each.atoms);
    atoms.add(0, when.negated());
    List<Atom> open = definer.open(atoms);
    if (open.contains(Atom.TRUE)) {
      return Optional.empty();
    }
    // With both directions the literal is there already.
    if (each.linear.isEmpty() || open.size() > 1 || mode == Conditional.Mode.IFF) {
      atoms.addAll(atoms(each));
      return clause(atoms).map(clause -> clause);
    }
    Atom only = open.isEmpty() ? Atom.TRUE : open.get(0).negated();
    return Optional.of(conditional(only, Conditional.Mode.IF, each.linear.get()));
  }

  /** The clause without what domains decide; empty where they make it true. */
  private Optional<Clause> clause(Collection<Atom> atoms) {
    List<Atom> open = definer.open(atoms);
    return open.contains(Atom.TRUE) ? Optional.empty() : Optional.of(new Clause(Atoms.of(open)));
  }
}
