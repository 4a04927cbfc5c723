package steelyard.results.statistics;

import org.apache.commons.statistics.inference.BinomialTest;

/**
 * Could so many wins against so few losses be luck?
 *
 * <p>The exact two-sided sign test: the chance of a split at least as uneven if wins and losses
 * were equally likely. Ties carry no information and are left out by the caller. On counts of
 * instances solved by one candidate only it is McNemar's exact test.
 *
 * <p>Fewer than six untied instances can never give a value of 0.05 or less.
 *
 * @see <a href="https://doi.org/10.1007/BF02295996">McNemar (1947), Psychometrika 12:153-157 (from
 *     memory)</a>
 */
public final class SignTest {

  private SignTest() {}

  /**
   * The two-sided p-value.
   *
   * @param wins at least 0
   * @param losses at least 0
   * @return in (0, 1]; 1 if there is neither
   */
  public static double twoSided(int wins, int losses) {
    if (wins < 0 || losses < 0) {
      throw new IllegalArgumentException(
          "wins and losses must be at least 0, were " + wins + " and " + losses);
    }
    int informative = Math.addExact(wins, losses);
    if (informative == 0) {
      return 1;
    }
    return BinomialTest.withDefaults().test(informative, wins, 0.5).getPValue();
  }
}
