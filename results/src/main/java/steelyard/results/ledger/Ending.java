package steelyard.results.ledger;

/** How a run ended, whatever it found. */
public enum Ending {
  /** The solver answered the goal it was given. */
  COMPLETED,
  /** The wall limit cut it off. */
  TIME_LIMIT,
  /** The work limit cut it off. */
  WORK_LIMIT,
  /** It asked for more memory than it was allowed. */
  MEMORY_LIMIT,
  /** The process died or broke the protocol. */
  CRASHED,
  /** The backend refused the model by name, or its library could not be used. */
  UNSUPPORTED,
  /** The operator or the machine stopped it; never final, run again on resume. */
  STOPPED
}
