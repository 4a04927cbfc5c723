package steelyard.variants.model.build;

import java.util.List;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Definition;

/** A formula as adapters see it: total definitions of auxiliary variables, and what must hold. */
record Flat(List<Definition> definitions, List<Constraint> asserted) {
  Flat {
    definitions = List.copyOf(definitions);
    asserted = List.copyOf(asserted);
  }
}
