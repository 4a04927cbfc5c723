package steelyard.adapters.cpsat;

import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.cpsat.RelationLowering.Parts;
import steelyard.adapters.spi.Decomposition;
import steelyard.adapters.spi.Reduction;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Table;

/**
 * States constraints. A relation under a condition is the library's own with an enforcement
 * literal, which is half of a reification; the other half, that the relation fails, is the
 * library's own where the kind is closed under negation, else the shared decomposition.
 */
final class ConstraintLowering {
  private final Parts parts;
  private final SortedMap<String, String> how = new TreeMap<>();

  ConstraintLowering(Parts parts) {
    this.parts = parts;
  }

  /** By kind and form of relation, how it was stated. */
  SortedMap<String, String> how() {
    return how;
  }

  void lower(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      lower(conditional);
    } else {
      Relation relation = (Relation) constraint;
      lower(Atom.TRUE, relation, relation.kind());
    }
  }

  private void lower(Conditional conditional) {
    Atom when = parts.literals().canonical(conditional.when());
    Relation then = conditional.then();
    if (conditional.mode() != Conditional.Mode.ONLY_IF && !when.equals(Atom.FALSE)) {
      lower(when, then, then.kind() + " if");
    }
    if (conditional.mode() != Conditional.Mode.IF && !when.equals(Atom.TRUE)) {
      note(then.kind() + " only if", refuteUnless(when, then));
    }
  }

  /** States the relation wherever a canonical atom is true. */
  private void lower(Atom when, Relation relation, String form) {
    Optional<String> stated = relation.accept(new RelationLowering(parts, given(when)));
    note(
        form,
        stated.orElseGet(() -> decompose(new Conditional(when, Conditional.Mode.IF, relation))));
  }

  /** The literal of a canonical atom as enforcement; none of a true one. */
  private int[] given(Atom canonical) {
    return canonical.isConstant() ? new int[0] : new int[] {parts.literals().of(canonical)};
  }

  private String refuteUnless(Atom when, Relation relation) {
    int[] otherwise = given(when.negated());
    RelationLowering lowering = new RelationLowering(parts, otherwise);
    if (relation instanceof Linear linear) {
      return lowering.linear(negation(linear)).orElseThrow();
    }
    if (relation instanceof Clause clause) {
      clause.atoms().stream().forEach(atom -> lowering.clause(Clause.of(atom.negated())));
      return "native";
    }
    Optional<String> stated =
        relation instanceof Table table ? lowering.table(negation(table)) : Optional.empty();
    return stated.orElseGet(
        () -> decompose(new Conditional(when, Conditional.Mode.ONLY_IF, relation)));
  }

  private String decompose(Conditional constraint) {
    Reduction reduction = Decomposition.of(constraint, parts.places().fresh());
    parts.places().declareFresh();
    ConstraintLowering quietly = new ConstraintLowering(parts);
    reduction.definitions().forEach(d -> quietly.lower(d.constraint()));
    reduction.asserted().forEach(quietly::lower);
    return reduction.how();
  }

  private static Linear negation(Linear relation) {
    long bound = relation.bound();
    return switch (relation.op()) {
      case LE -> new Linear(relation.sum(), Comparison.GE, bound + 1);
      case GE -> new Linear(relation.sum(), Comparison.LE, bound - 1);
      case EQ -> new Linear(relation.sum(), Comparison.NE, bound);
      case NE -> new Linear(relation.sum(), Comparison.EQ, bound);
    };
  }

  private static Table negation(Table table) {
    Table.Polarity flipped =
        table.polarity() == Table.Polarity.ALLOWED
            ? Table.Polarity.FORBIDDEN
            : Table.Polarity.ALLOWED;
    return new Table(table.scope(), table.rows(), flipped);
  }

  private void note(String form, String text) {
    how.merge(form, text, (known, more) -> known.contains(more) ? known : known + "; " + more);
  }
}
