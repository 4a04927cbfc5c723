package steelyard.adapters.engine.propagators;

/** How much a relation shall remove where there is a choice. */
public enum Level {
  /** Bounds(Z). */
  BOUNDS,
  /** Domain, where the domains are narrow enough for it. */
  DOMAIN
}
