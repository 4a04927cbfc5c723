package steelyard.adapters.engine.search;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Store;

/** Decides what to try next. */
public interface Brancher {
  /** Nothing is left to decide. */
  long NONE = Atom.TRUE;

  /**
   * An atom that is neither true nor false, to be tried first and negated later; or {@link #NONE}.
   */
  long next(Store s);

  /** Hears that the decision {@code atom} ended in a conflict, before it is negated. */
  default void failed(long atom) {}

  /** Hears that everything is fixed to a solution. */
  default void solved(Store s) {}

  /** Hears that the search goes back to the root to start again. */
  default void restarted() {}
}
