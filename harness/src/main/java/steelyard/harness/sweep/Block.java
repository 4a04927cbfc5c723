package steelyard.harness.sweep;

import java.util.List;
import java.util.Objects;

/**
 * Runs that belong together for a fair comparison: candidates on one instance and seed, one after
 * the other.
 *
 * @param number its place in the plan, from 0
 * @param contest whose candidates they are
 * @param instance what they run on
 * @param seed the seed of all runs
 * @param order the candidates in the order in which they run, each once, the one in service among
 *     them
 */
public record Block(
    int number, Contest contest, Instance instance, long seed, List<Candidate> order) {

  public Block {
    Objects.requireNonNull(instance, "instance");
    order = List.copyOf(order);
    if (number < 0 || seed < 0) {
      throw new IllegalArgumentException("number or seed below 0: " + number + ", " + seed);
    }
    if (!order.contains(contest.inService())) {
      throw new IllegalArgumentException("the one in service is not in block " + number);
    }
    for (int i = 1; i < order.size(); i++) {
      if (order.subList(0, i).contains(order.get(i))) {
        throw new IllegalArgumentException(order.get(i) + " comes twice in block " + number);
      }
    }
  }
}
