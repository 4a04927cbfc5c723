package steelyard.adapters.spi;

import java.util.List;
import java.util.Objects;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Relation;

/**
 * When a relation holds: clauses that are all true exactly where it does, over its variables and
 * fresh ones. Because the definitions are total, every assignment of the relation's variables has
 * exactly one completion, whether the relation holds or not; so one truth serves the posted, the
 * conditional and the negated form, and keeps counts of solutions.
 *
 * @param how the decomposition's name and published source
 * @param definitions of the fresh variables, in an order in which each needs only earlier ones; of
 *     five shapes: a literal IFF a linear relation, a literal IFF a clause, an element relation
 *     whose index cannot leave the array, an allowed table with one row for each value of the
 *     columns before the last, and a division whose divisor cannot be 0
 * @param holds none where the relation always holds; an empty clause where it never does
 * @param implied what follows where the relation holds: says nothing new, and helps backends to see
 *     earlier that the relation cannot hold
 */
public record Truth(
    String how, List<Definition> definitions, List<Clause> holds, List<Relation> implied) {
  public Truth {
    Objects.requireNonNull(how, "how");
    definitions = List.copyOf(definitions);
    holds = List.copyOf(holds);
    implied = List.copyOf(implied);
  }
}
