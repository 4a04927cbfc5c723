package steelyard.adapters.spi;

import java.util.List;
import java.util.Objects;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Definition;

/**
 * When a relation holds: clauses that are all true exactly where it does, over its variables and
 * fresh ones. Because the definitions are total, every assignment of the relation's variables has
 * exactly one completion, whether the relation holds or not; so one truth serves the posted, the
 * conditional and the negated form, and keeps counts of solutions.
 *
 * @param how the decomposition's name and published source
 * @param definitions of the fresh variables, in an order in which each needs only earlier ones; of
 *     three shapes: a literal IFF a linear relation, a literal IFF a clause, and an element
 *     relation over two entries whose index is a Boolean
 * @param holds none where the relation always holds; an empty clause where it never does
 */
public record Truth(String how, List<Definition> definitions, List<Clause> holds) {
  public Truth {
    Objects.requireNonNull(how, "how");
    definitions = List.copyOf(definitions);
    holds = List.copyOf(holds);
  }
}
