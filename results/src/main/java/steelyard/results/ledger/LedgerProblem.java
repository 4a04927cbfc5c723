package steelyard.results.ledger;

/** Says in one line what is wrong with a ledger or a record, where, and what to do about it. */
public final class LedgerProblem extends RuntimeException {

  private static final long serialVersionUID = 1L;

  /**
   * A problem that a person can act on.
   *
   * @param what what is wrong and where
   * @param remedy what to do
   */
  public LedgerProblem(String what, String remedy) {
    super(oneLine(what + "; " + remedy));
  }

  LedgerProblem(String what, String remedy, Throwable cause) {
    super(oneLine(what + "; " + remedy), cause);
  }

  private static String oneLine(String text) {
    return text.strip().replaceAll("\\s*\\R\\s*", " ");
  }
}
