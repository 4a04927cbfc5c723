package steelyard.adapters.spi;

import java.util.List;
import java.util.Objects;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Definition;

/**
 * A constraint said in simpler ones, over its variables and fresh ones, of which a solution leaves
 * each one value.
 *
 * @param how the decomposition's name and published source
 * @param definitions of fresh variables, as in {@link Truth}; others are bound by what is asserted
 * @param asserted what must hold, none where the constraint always does: clauses, linear relations,
 *     allowed tables, all-different, and these under a condition
 */
public record Reduction(String how, List<Definition> definitions, List<Constraint> asserted) {
  public Reduction {
    Objects.requireNonNull(how, "how");
    definitions = List.copyOf(definitions);
    asserted = List.copyOf(asserted);
  }
}
