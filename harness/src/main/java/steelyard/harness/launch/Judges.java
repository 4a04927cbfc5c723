package steelyard.harness.launch;

import steelyard.results.ledger.Digest;

/** Which code judges. */
public final class Judges {
  private Judges() {}

  /** Digest of the code that judges answers, the families aside. */
  public static Digest code(Installation installation) {
    return new CodeDigests(installation).judge();
  }
}
