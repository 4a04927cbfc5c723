package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * A plan made order by order: those that no carrier takes first, then by fee, each where it makes a
 * tour dearer by least, unless the carrier is cheaper. Cheapest insertion: Rosenkrantz, Stearns
 * &amp; Lewis (1977), "An Analysis of Several Heuristics for the Traveling Salesman Problem", SIAM
 * Journal on Computing 6(3):563-581.
 */
final class GreedyPlan {
  private final Dispatch day;
  private Plan plan;

  private GreedyPlan(Dispatch day) {
    this.day = day;
    this.plan = Plan.idle(day);
  }

  /** The plan; empty if an order that no carrier takes does not fit in. */
  static Optional<Plan> of(Dispatch day) {
    GreedyPlan greedy = new GreedyPlan(day);
    for (int stop : day.dearestFirst()) {
      if (!greedy.deliver(stop)) {
        return Optional.empty();
      }
    }
    return Optional.of(greedy.plan);
  }

  /** Takes the order into a tour or leaves it to the carrier; false if neither can be. */
  private boolean deliver(int stop) {
    Order order = day.order(stop);
    Optional<Insertion> best =
        day.truckNumbers()
            .boxed()
            .flatMap(truck -> insertions(truck, stop).stream())
            .min(Comparator.comparingLong(Insertion::added));
    boolean isWorthIt = best.isPresent() && (order.isOurs() || best.get().added <= order.carrier());
    if (isWorthIt) {
      plan = plan.with(best.get().truck, best.get().tour);
    }
    return isWorthIt || !order.isOurs();
  }

  /** A tour with one stop more. */
  private record Insertion(int truck, List<Integer> tour, long added) {}

  private List<Insertion> insertions(int truck, int stop) {
    List<Integer> tour = plan.tour(truck);
    long before = Plan.cost(day, truck, tour);
    List<Insertion> insertions = new ArrayList<>();
    for (int at = 0; at <= tour.size(); at++) {
      List<Integer> longer = new ArrayList<>(tour);
      longer.add(at, stop);
      if (Plan.begins(day, truck, longer).isPresent()) {
        insertions.add(new Insertion(truck, longer, Plan.cost(day, truck, longer) - before));
      }
    }
    return insertions;
  }
}
