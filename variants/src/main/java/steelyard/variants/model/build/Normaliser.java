package steelyard.variants.model.build;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/**
 * Turns one formula into relations, relations under a condition, and total definitions of auxiliary
 * variables, once, so that every adapter sees the same few shapes. A part that stands where only
 * its truth matters becomes a literal that is true exactly where the part holds, so that solution
 * counts over the model's variables stay exact and what is asserted can be negated.
 */
final class Normaliser {
  private final Pool pool;
  private final List<Definition> definitions = new ArrayList<>();
  private final List<Constraint> asserted = new ArrayList<>();
  private final Map<Formula, Atom> literals = new HashMap<>();
  private final TermFlattener terms;

  private Normaliser(Pool pool) {
    this.pool = pool;
    this.terms = new TermFlattener(pool, definitions, this::literal);
  }

  /** What must hold for {@code formula} to hold. */
  static Flat asserted(Formula formula, Pool pool) {
    Normaliser it = new Normaliser(pool);
    it.require(formula, true);
    return new Flat(it.definitions, it.asserted);
  }

  /**
   * The definition of {@code own} as {@code term}.
   *
   * @throws ModelException if the term is undefined somewhere
   */
  static Flat definition(View own, Term term, Pool pool) {
    Normaliser it = new Normaliser(pool);
    List<Atom> guards = new ArrayList<>();
    Constraint constraint =
        TermFlattener.hasRelation(term)
            ? it.terms.defining(term, own, guards)
            : TermFlattener.equation(it.terms.linear(term, guards), own);
    if (guards.stream().anyMatch(guard -> !it.simplified(guard).equals(Atom.TRUE))) {
      throw new ModelException(
          "is undefined for some values: " + term + "; a definition must be total");
    }
    it.define(own, constraint);
    return new Flat(it.definitions, List.of());
  }

  /** The definition of {@code own} as 1 where {@code formula} holds, else 0. */
  static Flat definition(View own, Formula formula, Pool pool) {
    Normaliser it = new Normaliser(pool);
    Optional<Relation> relation = it.leaf(formula);
    if (relation.isPresent()) {
      it.define(own, new Conditional(own.atLeast(1), Conditional.Mode.IFF, relation.get()));
    } else {
      LinearSum truth = it.terms.linear(Term.truth(formula), new ArrayList<>());
      it.define(own, TermFlattener.equation(truth, own));
    }
    return new Flat(it.definitions, List.of());
  }

  private void define(View own, Constraint constraint) {
    definitions.add(new Definition(own.variable(), constraint));
  }

  private void require(Formula formula, boolean wanted) {
    if (formula instanceof Formula.Not not) {
      require(not.part(), !wanted);
    } else if (formula instanceof Formula.All all && wanted) {
      all.parts().forEach(part -> require(part, true));
    } else if (formula instanceof Formula.Any any && !wanted) {
      any.parts().forEach(part -> require(part, false));
    } else if (formula instanceof Formula.All all) {
      requireAny(all.parts(), false);
    } else if (formula instanceof Formula.Any any) {
      requireAny(any.parts(), true);
    } else if (formula instanceof Formula.Iff iff) {
      requireSame(iff.left(), iff.right(), wanted);
    } else if (formula instanceof Formula.Compare compare) {
      require(compare, wanted);
    } else if (formula instanceof Formula.Literal literal) {
      clause(List.of(wanted ? literal.atom() : literal.atom().negated()));
    } else {
      require(((Formula.Holds) formula).relation(), wanted);
    }
  }

  private void require(Formula.Compare compare, boolean wanted) {
    Optional<Formula> split = wanted ? Splitting.ofExtreme(compare) : Optional.empty();
    if (split.isPresent()) {
      require(split.get(), true);
      return;
    }
    List<Atom> guards = new ArrayList<>();
    Linear linear = linear(compare, guards);
    guards.replaceAll(this::simplified);
    guards.removeIf(Atom.TRUE::equals);
    if (wanted) {
      guards.forEach(guard -> clause(List.of(guard)));
      require(linear, true);
    } else if (guards.isEmpty()) {
      require(linear, false);
    } else {
      List<Formula> ways = new ArrayList<>();
      guards.forEach(guard -> ways.add(Formula.literal(guard.negated())));
      ways.add(Formula.holds(linear).not());
      requireAny(ways, true);
    }
  }

  private void require(Relation relation, boolean wanted) {
    Optional<Atom> atom = atomOf(relation);
    if (atom.isPresent()) {
      clause(List.of(wanted ? atom.get() : atom.get().negated()));
    } else if (wanted) {
      asserted.add(relation);
    } else if (relation instanceof Linear linear) {
      require(negated(linear), true);
    } else if (relation instanceof Clause clause) {
      clause.atoms().stream().forEach(a -> clause(List.of(a.negated())));
    } else {
      asserted.add(Conditional.not(relation));
    }
  }

  /** At least one part is {@code wanted}. */
  private void requireAny(List<Formula> parts, boolean wanted) {
    List<Atom> atoms = new ArrayList<>();
    List<Formula> others = new ArrayList<>();
    for (Formula part : Splitting.disjuncts(parts, wanted)) {
      Optional<Atom> atom = cheapLiteral(part);
      atom.ifPresentOrElse(atoms::add, () -> others.add(part));
    }
    // One part need not become a literal where the others leave a single condition for it.
    Formula last = others.isEmpty() ? null : others.remove(others.size() - 1);
    others.forEach(part -> atoms.add(literal(part)));
    atoms.removeIf(Atom.FALSE::equals);
    if (last == null) {
      clause(atoms);
    } else if (atoms.isEmpty()) {
      require(last, true);
    } else if (atoms.size() == 1 && leaf(last).isPresent()) {
      asserted.add(
          new Conditional(atoms.get(0).negated(), Conditional.Mode.IF, leaf(last).orElseThrow()));
    } else if (!atoms.contains(Atom.TRUE)) {
      atoms.add(literal(last));
      clause(atoms);
    }
  }

  private void requireSame(Formula left, Formula right, boolean same) {
    boolean leftIsCheap = cheapLiteral(left).isPresent();
    Atom atom = literal(leftIsCheap ? left : right);
    Formula other = leftIsCheap ? right : left;
    Atom when = same ? atom : atom.negated();
    Optional<Relation> relation = leaf(other);
    if (relation.isPresent() && !when.isConstant()) {
      asserted.add(new Conditional(when, Conditional.Mode.IFF, relation.get()));
    } else {
      Atom literal = literal(other);
      clause(List.of(when.negated(), literal));
      clause(List.of(when, literal.negated()));
    }
  }

  /** At least one atom holds. */
  private void clause(List<Atom> atoms) {
    List<Atom> open = atoms.stream().map(this::simplified).distinct().toList();
    if (open.contains(Atom.TRUE)) {
      return;
    }
    asserted.add(new Clause(Atoms.of(open.stream().filter(a -> !a.isConstant()).toList())));
  }

  /** The atom that is true exactly where the formula holds. */
  Atom literal(Formula formula) {
    if (formula instanceof Formula.Not not) {
      return literal(not.part()).negated();
    }
    Optional<Atom> cheap = cheapLiteral(formula);
    if (cheap.isPresent()) {
      return cheap.get();
    }
    Atom known = literals.get(formula);
    if (known == null) {
      known = newLiteral(formula);
      literals.put(formula, known);
    }
    return known;
  }

  private Atom newLiteral(Formula formula) {
    if (formula instanceof Formula.All all) {
      return anyOf(all.parts().stream().map(part -> literal(part).negated()).toList()).negated();
    }
    if (formula instanceof Formula.Any any) {
      return anyOf(any.parts().stream().map(this::literal).toList());
    }
    if (formula instanceof Formula.Iff iff) {
      View left = terms.truth(literal(iff.left()));
      View right = terms.truth(literal(iff.right()));
      return literal(left.eq(right));
    }
    if (formula instanceof Formula.Compare compare) {
      List<Atom> guards = new ArrayList<>();
      Atom holds = literalOf(linear(compare, guards));
      List<Atom> broken = new ArrayList<>(guards.stream().map(Atom::negated).toList());
      broken.add(holds.negated());
      return anyOf(broken).negated();
    }
    return literalOf(((Formula.Holds) formula).relation());
  }

  private Atom literalOf(Relation relation) {
    Optional<Atom> atom = atomOf(relation);
    if (atom.isPresent()) {
      return atom.get();
    }
    return terms
        .define(
            Domain.BOOLEAN, own -> new Conditional(own.atLeast(1), Conditional.Mode.IFF, relation))
        .atLeast(1);
  }

  private Atom anyOf(List<Atom> atoms) {
    List<Atom> open =
        atoms.stream().map(this::simplified).filter(a -> !a.equals(Atom.FALSE)).distinct().toList();
    if (open.isEmpty()) {
      return Atom.FALSE;
    }
    if (open.contains(Atom.TRUE)) {
      return Atom.TRUE;
    }
    return open.size() == 1 ? open.get(0) : literalOf(new Clause(Atoms.of(open)));
  }

  /** The formula's literal if it costs no variable. */
  private Optional<Atom> cheapLiteral(Formula formula) {
    if (formula instanceof Formula.Literal literal) {
      return Optional.of(simplified(literal.atom()));
    }
    if (formula instanceof Formula.Not not) {
      return cheapLiteral(not.part()).map(Atom::negated);
    }
    return leaf(formula).flatMap(this::atomOf);
  }

  /** The relation that the formula is, if it is one without auxiliaries. */
  private Optional<Relation> leaf(Formula formula) {
    if (formula instanceof Formula.Holds holds) {
      return Optional.of(holds.relation());
    }
    if (formula instanceof Formula.Not not) {
      return leaf(not.part())
          .filter(Linear.class::isInstance)
          .map(relation -> negated((Linear) relation));
    }
    if (formula instanceof Formula.Compare compare && Splitting.isLinear(compare)) {
      return Optional.of(linear(compare, new ArrayList<>()));
    }
    return Optional.empty();
  }

  /** The relation as a literal of a variable that is there already, if it is one. */
  private Optional<Atom> atomOf(Relation relation) {
    if (relation instanceof Clause clause && clause.atoms().size() <= 1) {
      return Optional.of(
          clause.atoms().size() == 0 ? Atom.FALSE : simplified(clause.atoms().get(0)));
    }
    return relation instanceof Linear linear
        ? Unary.atom(linear, pool).map(this::simplified)
        : Optional.empty();
  }

  /** The atom, or the constant that it is on its variable's domain. */
  private Atom simplified(Atom atom) {
    return Unary.simplified(atom, pool);
  }

  private Linear linear(Formula.Compare compare, List<Atom> guards) {
    LinearSum difference = terms.linear(compare.left().minus(compare.right()), guards);
    // The range check keeps every later sum, its negation included, within 2^62 - 1.
    Range.of(difference, pool);
    return Linear.of(difference, compare.op(), 0);
  }

  private static Linear negated(Linear linear) {
    return switch (linear.op()) {
      case LE -> new Linear(linear.sum(), Comparison.GE, linear.bound() + 1);
      case GE -> new Linear(linear.sum(), Comparison.LE, linear.bound() - 1);
      case EQ -> new Linear(linear.sum(), Comparison.NE, linear.bound());
      case NE -> new Linear(linear.sum(), Comparison.EQ, linear.bound());
    };
  }
}
