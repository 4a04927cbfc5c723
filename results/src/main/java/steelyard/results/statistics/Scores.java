package steelyard.results.statistics;

import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * How did one candidate do over a set of instances, in one number?
 *
 * <p>Every function takes one inner list per instance, with one entry per run of that instance
 * (seeds, repetitions). Entries are averaged within the instance, then instances count once each.
 */
public final class Scores {

  private Scores() {}

  /**
   * The number of instances for which a fact holds; an instance of which it holds for some runs
   * counts as that share of one.
   *
   * @return between 0 and the number of instances; 0 if there are none
   */
  public static double count(List<List<Boolean>> instances) {
    double sum = 0;
    for (List<Boolean> runs : instances) {
      sum += meanOf(runs, holds -> holds ? 1 : 0);
    }
    return sum;
  }

  /**
   * Penalised average run time (PAR-k): the mean solve time, where a run without an answer counts
   * as {@code factor} times its limit.
   *
   * <p>With factor 1 it is the restricted mean time to the limit. Two values compare only with the
   * same limit, factor and instances.
   *
   * @param factor at least 1
   * @return seconds
   * @throws IllegalArgumentException if there is no instance, or one without runs
   * @see <a href="https://doi.org/10.1613/jair.2861">Hutter, Hoos, Leyton-Brown &amp; Stützle
   *     (2009), JAIR 36:267-306 (PAR-10; from memory)</a>
   */
  public static double penalisedMean(List<List<SolveTime>> instances, double factor) {
    if (!(factor >= 1)) {
      throw new IllegalArgumentException("the penalty factor must be at least 1, was " + factor);
    }
    return meanOverInstances(
        instances, time -> time.censored() ? factor * time.seconds() : time.seconds());
  }

  /**
   * Shifted geometric mean: exp(mean of ln(tᵢ + s)) − s, where a run without an answer enters at
   * its limit.
   *
   * <p>The shift damps differences between times far below it. With shift 0 it is the geometric
   * mean.
   *
   * @param shiftSeconds s, at least 0; positive where a time may be 0
   * @return seconds
   * @throws IllegalArgumentException if there is no instance, or one without runs
   * @see <a href="https://nbn-resolving.org/urn:nbn:de:0297-zib-11129">Achterberg (2007),
   *     Constraint Integer Programming, PhD thesis, TU Berlin, appendix A (from memory)</a>
   */
  public static double shiftedGeometricMean(List<List<SolveTime>> instances, double shiftSeconds) {
    if (!(shiftSeconds >= 0)) {
      throw new IllegalArgumentException("the shift must be at least 0, was " + shiftSeconds);
    }
    double meanLog =
        meanOverInstances(instances, time -> StrictMath.log(time.seconds() + shiftSeconds));
    return StrictMath.exp(meanLog) - shiftSeconds;
  }

  private static double meanOverInstances(
      List<List<SolveTime>> instances, ToDoubleFunction<SolveTime> value) {
    if (instances.isEmpty()) {
      throw new IllegalArgumentException("a mean needs at least one instance");
    }
    double sum = 0;
    for (List<SolveTime> runs : instances) {
      sum += meanOf(runs, value);
    }
    return sum / instances.size();
  }

  private static <T> double meanOf(List<T> runs, ToDoubleFunction<T> value) {
    if (runs.isEmpty()) {
      throw new IllegalArgumentException("an instance needs at least one run");
    }
    double sum = 0;
    for (T run : runs) {
      sum += value.applyAsDouble(run);
    }
    return sum / runs.size();
  }
}
