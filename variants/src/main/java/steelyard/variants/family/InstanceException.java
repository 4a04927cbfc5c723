package steelyard.variants.family;

/**
 * A file that does not hold an instance: one line that says where, what was found, what is meant.
 */
public final class InstanceException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  public InstanceException(String message) {
    super(message);
  }

  public InstanceException(String message, Throwable cause) {
    super(message, cause);
  }

  /** {@code source:line: what}. */
  public static InstanceException at(InstanceSource source, int line, String what) {
    return new InstanceException(source.name() + ":" + line + ": " + what);
  }
}
