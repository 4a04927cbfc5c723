package steelyard.harness.sweep;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * In which order are instances taken, so that wherever the night is cut off, what was done is a
 * small fair sample of the whole?
 *
 * <p>Classes alternate in proportion to their numbers of instances: after every m instances each
 * class has been served within 1 of its share m·n_c/N. Within a class the heavier instances come
 * first, and equally heavy ones are taken across their sizes: first one from the small, one from
 * the large, then from between.
 */
final class FairOrder {

  private FairOrder() {}

  /**
   * Merges strata, each in its own order, so that in every prefix each stratum's count is within 1
   * - 1/(2k - 2) of its proportional share, k being the number of strata. O(N·k).
   *
   * @see <a href="https://doi.org/10.1016/0012-365X(80)90269-1">Tijdeman (1980), The chairman
   *     assignment problem, Discrete Mathematics 32(3):323-330 (from memory)</a>
   */
  static <T> List<T> merge(List<List<T>> strata) {
    List<List<T>> filled = strata.stream().filter(stratum -> !stratum.isEmpty()).toList();
    int total = filled.stream().mapToInt(List::size).sum();
    int[] taken = new int[filled.size()];
    List<T> merged = new ArrayList<>(total);
    for (int step = 1; step <= total; step++) {
      int next = filled.size() == 1 ? 0 : next(filled, taken, step, total);
      merged.add(filled.get(next).get(taken[next]));
      taken[next]++;
    }
    return merged;
  }

  /**
   * Among the strata that may be served now, the one whose deadline is the earliest. All of
   * Tijdeman's quantities are multiplied by N·(2k - 2), so that they are whole.
   */
  private static <T> int next(List<List<T>> strata, int[] taken, int step, int total) {
    long scale = 2L * strata.size() - 2;
    int best = -1;
    long bestSlack = 0;
    for (int i = 0; i < taken.length; i++) {
      long size = strata.get(i).size();
      long owed = scale * (size * step - (long) total * taken[i]);
      long slack = total * (scale - 1) - owed;
      if (owed >= total && (best < 0 || slack * strata.get(best).size() < bestSlack * size)) {
        best = i;
        bestSlack = slack;
      }
    }
    return best;
  }

  /** The instances of one class in the order in which they are taken. */
  static List<Instance> within(List<Instance> instances) {
    List<Instance> ordered = new ArrayList<>();
    List<Double> weights =
        instances.stream()
            .map(Instance::weight)
            .distinct()
            .sorted(Comparator.reverseOrder())
            .toList();
    for (double weight : weights) {
      ordered.addAll(acrossSizes(instances.stream().filter(i -> i.weight() == weight).toList()));
    }
    return ordered;
  }

  /**
   * By size, then the ranks in the order of their reversed bits: every prefix is spread over all
   * sizes.
   *
   * @see <a href="https://en.wikipedia.org/wiki/Van_der_Corput_sequence">van der Corput (1935),
   *     Verteilungsfunktionen, Proc. Akad. Amsterdam 38:813-821 (from memory)</a>
   */
  private static List<Instance> acrossSizes(List<Instance> instances) {
    List<Instance> bySize =
        instances.stream()
            .sorted(Comparator.comparingLong(Instance::bytes).thenComparing(Instance::name))
            .toList();
    int bits = Integer.SIZE - Integer.numberOfLeadingZeros(bySize.size() - 1);
    List<Instance> spread = new ArrayList<>();
    for (int i = 0; i < 1 << bits; i++) {
      int rank = bits == 0 ? 0 : Integer.reverse(i) >>> (Integer.SIZE - bits);
      if (rank < bySize.size()) {
        spread.add(bySize.get(rank));
      }
    }
    return spread;
  }
}
