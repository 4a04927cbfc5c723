package steelyard.harness.launch;

/** What keeps the harness from its task, in one line for people: what, where, what to do. */
public final class HarnessProblem extends RuntimeException {
  private static final long serialVersionUID = 1L;

  public HarnessProblem(String message) {
    super(message);
  }

  public HarnessProblem(String message, Throwable cause) {
    super(message, cause);
  }
}
