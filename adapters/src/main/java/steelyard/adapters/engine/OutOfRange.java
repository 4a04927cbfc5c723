package steelyard.adapters.engine;

/** Part of a model reaches values that the engine's ints cannot hold; says which. */
final class OutOfRange extends RuntimeException {
  private static final long serialVersionUID = 1L;

  OutOfRange(String message) {
    super(message);
  }
}
