package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Variables;

/**
 * The domains of a model's variables and of new ones made beside them; ids go on where the model's
 * end.
 */
public final class Fresh {
  private final List<Domain> domains;

  private Fresh(List<Domain> domains) {
    this.domains = new ArrayList<>(domains);
  }

  public static Fresh beside(Variables variables) {
    return beside(IntStream.range(0, variables.size()).mapToObj(variables::domain).toList());
  }

  /** Beside variables of the given domains, by id: a backend may have narrowed the model's. */
  public static Fresh beside(List<Domain> domains) {
    return new Fresh(domains);
  }

  /** The domain of a variable, of the model's or new. */
  public Domain domain(int variable) {
    return domains.get(variable);
  }

  /** How many variables there are, new ones included; the id of the next. */
  public int size() {
    return domains.size();
  }

  /** Makes a variable; its id. */
  public int variable(Domain domain) {
    domains.add(domain);
    return domains.size() - 1;
  }
}
