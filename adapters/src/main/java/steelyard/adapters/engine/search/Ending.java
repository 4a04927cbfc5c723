package steelyard.adapters.engine.search;

/** Why a search ended. */
public enum Ending {
  /** The whole tree is done: there is no further, or no better, solution. */
  EXHAUSTED,
  /** The limit on decisions. */
  NODES,
  /** The limit on conflicts. */
  FAILURES,
  /** The limit on solutions, or the listener had enough. */
  SOLUTIONS,
  /** The caller asked for the end. */
  STOPPED
}
