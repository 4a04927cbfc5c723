package steelyard.variants.model.build;

/** A model that cannot be: says in one line what is wrong and who posted it. */
public final class ModelException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  public ModelException(String message) {
    super(message);
  }

  public ModelException(String message, Throwable cause) {
    super(message, cause);
  }
}
