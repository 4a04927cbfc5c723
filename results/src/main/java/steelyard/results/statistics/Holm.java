package steelyard.results.statistics;

import java.util.Comparator;
import java.util.stream.IntStream;

/**
 * What does each of several p-values say once it is known that several were looked at?
 *
 * <p>With p₍₁₎ ≤ … ≤ p₍ₘ₎ the adjusted value of p₍ᵢ₎ is the maximum over j ≤ i of min(1, (m − j +
 * 1)·p₍ⱼ₎). Holds the chance of any false positive under any dependence.
 *
 * @see <a href="https://www.jstor.org/stable/4615733">Holm (1979), A simple sequentially rejective
 *     multiple test procedure, Scandinavian Journal of Statistics 6:65-70 (from memory)</a>
 */
public final class Holm {

  private Holm() {}

  /**
   * The adjusted values.
   *
   * @param pValues each in [0, 1]; not modified
   * @return in the order of the argument
   */
  public static double[] adjust(double[] pValues) {
    int[] order =
        IntStream.range(0, pValues.length)
            .boxed()
            .sorted(Comparator.comparingDouble(i -> pValues[i]))
            .mapToInt(Integer::intValue)
            .toArray();
    double[] adjusted = new double[pValues.length];
    double running = 0;
    for (int rank = 0; rank < order.length; rank++) {
      double scaled = (pValues.length - rank) * pValues[order[rank]];
      running = Math.max(running, Math.min(1, scaled));
      adjusted[order[rank]] = running;
    }
    return adjusted;
  }
}
