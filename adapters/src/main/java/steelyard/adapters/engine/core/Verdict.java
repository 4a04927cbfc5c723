package steelyard.adapters.engine.core;

/** What the current domains say about a relation. */
public enum Verdict {
  /** Every assignment within the domains satisfies it. */
  TRUE,
  /** No assignment within the domains satisfies it. */
  FALSE,
  /** Not known; never the answer when everything in the scope is fixed. */
  OPEN
}
