package steelyard.adapters.spi;

/** What a solve established. */
public enum Status {
  /** A best solution was found and proved to be best. */
  OPTIMAL,
  /** A solution was found. */
  FEASIBLE,
  /** There is none. */
  INFEASIBLE,
  /** Nothing. */
  UNKNOWN
}
