package steelyard.results.ledger;

/** What independent judging said of a run's solutions. */
public enum Check {
  /** No solution, or none judged yet. */
  UNCHECKED,
  /**
   * Every judged solution satisfies the variant's model, plain's shared variables and the checker.
   */
  VALID,
  /** At least one solution breaks something. */
  INVALID
}
