package steelyard.harness.cli;

/** What the command's exit status says. */
public final class ExitStatus {
  /** Done. */
  public static final int OK = 0;

  /** A mistake of this program; {@code --debug} shows where. */
  public static final int INTERNAL = 1;

  /** A mistake in what was given: usage, a file, a name, the ledger. */
  public static final int BAD_INPUT = 2;

  /** A repeated run differs from the one it repeats. */
  public static final int DIFFERENT = 4;

  /** A solution is invalid, or answers contradict each other. */
  public static final int FINDING = 5;

  private ExitStatus() {}
}
