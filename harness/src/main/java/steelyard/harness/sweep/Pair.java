package steelyard.harness.sweep;

/**
 * Two candidates of one family to be shown against each other.
 *
 * @param before usually the one in service
 * @param after what might take its place
 */
public record Pair(Candidate before, Candidate after) {
  public Pair {
    if (before.equals(after)) {
      throw new IllegalArgumentException(before.name() + " is paired with itself");
    }
  }
}
