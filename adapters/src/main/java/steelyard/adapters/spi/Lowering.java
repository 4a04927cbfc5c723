package steelyard.adapters.spi;

import java.util.Optional;

/**
 * A model in a solver's own terms, to be solved once. A call of {@link #solve} that is not the
 * first is an error.
 */
public non-sealed interface Lowering extends Lowered, AutoCloseable {
  Sizes sizes();

  /**
   * Solves until the goal is answered or the request's deadline says stop. Reports each solution to
   * {@code monitor} as it is found, on the calling thread or another one, never two at a time.
   */
  SolveOutcome solve(Goal goal, Monitor monitor);

  /** What only some backends can do. */
  <F extends Facet> Optional<F> facet(Class<F> kind);

  @Override
  void close();
}
