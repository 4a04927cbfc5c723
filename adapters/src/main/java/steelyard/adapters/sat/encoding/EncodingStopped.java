package steelyard.adapters.sat.encoding;

/** Unwinds an encoding that passed one of its {@link Limits}. */
public final class EncodingStopped extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Which limit it passed. */
  public enum Why {
    VARIABLES,
    CLAUSES,
    STOP
  }

  private final Why why;

  EncodingStopped(Why why) {
    super(why.toString(), null, false, false);
    this.why = why;
  }

  public Why why() {
    return why;
  }
}
