package steelyard.adapters.engine.core;

/** Whether the caller wants the search to end; asked every few hundred propagations. */
@FunctionalInterface
public interface Stop {
  /** Never asks for the end. */
  Stop NEVER = () -> false;

  /** True once the search shall end; must be cheap, and stay true. */
  boolean asked();
}
