package steelyard.results.ledger;

/** What a run established about its instance, as in mathematical programming. */
public enum Status {
  /** A best solution was found and claimed to be best. */
  OPTIMAL,
  /** A solution was found; a satisfaction problem that is solved is feasible and completed. */
  FEASIBLE,
  /** The run claims that there is no solution. */
  INFEASIBLE,
  /** Neither a solution nor a claim. */
  UNKNOWN
}
