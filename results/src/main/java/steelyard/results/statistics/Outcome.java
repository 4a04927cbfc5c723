package steelyard.results.statistics;

import java.util.Collection;
import java.util.Collections;

/** How the after of a pair did beside its before. */
public enum Outcome {
  /** After is better. */
  WIN,
  /** After is worse. */
  LOSS,
  /** Both answered alike, in times too close to call. */
  TIE,
  /** Neither answered its goal and nothing else tells them apart: uninformative, not a tie. */
  BOTH_OPEN,
  /** Both solved the identical model in the identical way: what differs is noise. */
  UNCHANGED;

  /**
   * The outcome of an instance from the outcomes of its pairs of runs: whichever of win and loss is
   * more frequent; a tie if they balance or if all that is known are ties; open or unchanged if
   * nothing else is known.
   *
   * @throws IllegalArgumentException if there is no pair
   */
  public static Outcome ofInstance(Collection<Outcome> pairs) {
    if (pairs.isEmpty()) {
      throw new IllegalArgumentException("an instance needs at least one pair of runs");
    }
    int balance = Collections.frequency(pairs, WIN) - Collections.frequency(pairs, LOSS);
    if (balance != 0) {
      return balance > 0 ? WIN : LOSS;
    }
    if (pairs.contains(WIN) || pairs.contains(TIE)) {
      return TIE;
    }
    return pairs.contains(BOTH_OPEN) ? BOTH_OPEN : UNCHANGED;
  }
}
