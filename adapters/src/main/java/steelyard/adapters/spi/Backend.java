package steelyard.adapters.spi;

import java.util.Optional;
import steelyard.variants.model.Model;

/**
 * A solver technology behind one adapter; found through {@link java.util.ServiceLoader}. The class
 * names no type of its solver library, in no field, signature or lambda, so that it loads and
 * describes itself where the library is missing.
 */
public interface Backend {
  Description describe();

  /**
   * Loads the solver library, natives included, so that it costs none of the limit.
   *
   * @return why it cannot be used, if it cannot
   */
  default Optional<Refusal> load() {
    return Optional.empty();
  }

  /**
   * Looks for the program that runs with these settings start, and tries it out; a backend that
   * starts none is not asked. Those that start one have a setting of kind {@link
   * Setting.Kind#COMMAND}.
   */
  default Probe probe(Settings settings, Programs programs) {
    throw new UnsupportedOperationException(describe().name() + " starts no program");
  }

  /**
   * Makes of {@code model} what the solver reads. Lowers {@link Model#lowered()} only.
   *
   * @param model already permuted for the seed: adapters do not shuffle
   * @param monitor told of phases and counters while lowering
   * @return a lowering to solve once, or a refusal that names what cannot be lowered
   */
  Lowered lower(Model model, SolveRequest request, Monitor monitor);
}
