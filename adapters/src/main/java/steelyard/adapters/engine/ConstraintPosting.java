package steelyard.adapters.engine;

import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.propagators.Level;
import steelyard.adapters.engine.propagators.Relations;
import steelyard.adapters.spi.Decomposition;
import steelyard.adapters.spi.Reduction;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Table;

/**
 * Posts constraints. That a condition implies a relation is the engine's own form; that a relation
 * implies a condition is the same of its negation where the kind is closed under that, else the
 * shared decomposition.
 */
final class ConstraintPosting {
  private static final String NATIVE = "native";

  private final Places places;
  private final Relations relations;
  private final Level level;
  private final SortedMap<String, String> how = new TreeMap<>();

  ConstraintPosting(Places places, Network network, Level level) {
    this.places = places;
    this.relations = new Relations(network);
    this.level = level;
  }

  /** By kind and form of relation, how it was posted. */
  SortedMap<String, String> how() {
    return how;
  }

  void post(Constraint constraint, int tag) {
    if (constraint instanceof Conditional conditional) {
      if (conditional.mode() != Conditional.Mode.ONLY_IF) {
        imply(conditional.when(), conditional.then(), tag);
      }
      if (conditional.mode() != Conditional.Mode.IF) {
        refute(conditional.when(), conditional.then(), tag);
      }
    } else {
      imply(steelyard.variants.model.Atom.TRUE, (Relation) constraint, tag);
    }
  }

  /** Posts {@code when ⇒ relation}. */
  private void imply(steelyard.variants.model.Atom when, Relation relation, int tag) {
    String form = relation.kind() + (when.equals(steelyard.variants.model.Atom.TRUE) ? "" : " if");
    if (relation.accept(new RelationPosting(places, relations, level, tag, places.atom(when)))) {
      note(form, NATIVE);
    } else {
      decompose(new Conditional(when, Conditional.Mode.IF, relation), form, tag);
    }
  }

  /** Posts {@code relation ⇒ when}. */
  private void refute(steelyard.variants.model.Atom when, Relation relation, int tag) {
    long otherwise = Atom.not(places.atom(when));
    RelationPosting posting = new RelationPosting(places, relations, level, tag, otherwise);
    String form = relation.kind() + " only if";
    boolean posted =
        relation instanceof Linear linear
            ? posting.linear(negation(linear))
            : relation instanceof Table table && posting.table(negation(table));
    if (relation instanceof Clause clause) {
      clause.atoms().stream().forEach(atom -> posting.clause(Clause.of(atom.negated())));
      posted = true;
    }
    if (posted) {
      note(form, NATIVE);
    } else {
      decompose(new Conditional(when, Conditional.Mode.ONLY_IF, relation), form, tag);
    }
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

  private void decompose(Conditional constraint, String form, int tag) {
    Reduction reduction = Decomposition.of(constraint, places.fresh());
    places.declareFresh();
    note(form, reduction.how());
    ConstraintPosting quietly = new ConstraintPosting(this);
    reduction.definitions().forEach(d -> quietly.post(d.constraint(), tag));
    reduction.asserted().forEach(simpler -> quietly.post(simpler, tag));
  }

  private ConstraintPosting(ConstraintPosting of) {
    places = of.places;
    relations = of.relations;
    level = of.level;
  }

  private void note(String form, String text) {
    how.merge(form, text, (known, more) -> known.contains(more) ? known : known + "; " + more);
  }
}
