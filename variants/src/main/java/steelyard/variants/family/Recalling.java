package steelyard.variants.family;

import java.io.IOException;

/**
 * A family that reads solutions which the service in production has made: is the plain model the
 * one that is in service? It is where it accepts each of them, at the objective that production
 * booked.
 *
 * <p>Such files lie in a folder {@code known} beside the instances. The name of each is that of its
 * instance, a dot, and anything: {@code known/monday.plan} and {@code known/monday.2031-03-04.txt}
 * belong to the instance {@code monday}.
 *
 * @param <I> the family's instances
 */
public interface Recalling<I> extends Family<I> {
  /**
   * Reads a solution in production's own format.
   *
   * @throws InstanceException if the file does not hold a solution of that instance; says where and
   *     what to do
   * @throws IOException if it cannot be read
   */
  KnownSolution recall(I instance, InstanceSource file) throws IOException;
}
