package steelyard.results.ledger;

/** How a claim of optimality or infeasibility stands beside the other runs of its instance. */
public enum Claim {
  /** Nothing was claimed. */
  NONE,
  /** Nobody else has claimed anything. */
  ALONE,
  /** Another technology claims the same. */
  AGREED,
  /** A checked proof accompanies it. */
  PROVED,
  /** Another run's answer contradicts it. */
  CONTRADICTED
}
