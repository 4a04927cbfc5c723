package steelyard.variants.catalog.dispatch;

import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;

/**
 * A day's orders and trucks.
 *
 * @param trucks at least one, by number from 0
 * @param orders at least one; their stops are 1, 2, and so on
 * @param times quarters of an hour from stop to stop
 * @param costs of driving from stop to stop
 */
record Dispatch(List<Truck> trucks, List<Order> orders, Legs times, Legs costs) {
  /** No time, cost or load is larger, so that sums along a tour fit an int. */
  static final int LARGEST = 1_000_000;

  /** No more trucks, and no more orders. */
  static final int MOST = 1000;

  Dispatch {
    trucks = List.copyOf(trucks);
    orders = List.copyOf(orders);
    if (trucks.isEmpty() || orders.isEmpty() || trucks.size() > MOST || orders.size() > MOST) {
      throw new IllegalArgumentException(
          trucks.size()
              + " trucks for "
              + orders.size()
              + " orders; from 1 to "
              + MOST
              + " of each");
    }
    if (times.stops() != orders.size() + 1 || costs.stops() != orders.size() + 1) {
      throw new IllegalArgumentException(
          "times between "
              + times.stops()
              + " and costs between "
              + costs.stops()
              + " stops; the works and "
              + orders.size()
              + " orders are "
              + (orders.size() + 1));
    }
    requireOnlySmall(trucks, orders);
  }

  private static void requireOnlySmall(List<Truck> trucks, List<Order> orders) {
    boolean isLarge =
        trucks.stream().anyMatch(t -> Math.max(t.shift(), t.pallets()) > LARGEST)
            || orders.stream().anyMatch(o -> Math.max(o.closes(), o.unloading()) > LARGEST);
    if (isLarge) {
      throw new IllegalArgumentException("times and loads are at most " + LARGEST);
    }
  }

  /** The stops but the works. */
  IntStream stops() {
    return IntStream.rangeClosed(1, orders.size());
  }

  IntStream truckNumbers() {
    return IntStream.range(0, trucks.size());
  }

  Order order(int stop) {
    return orders.get(stop - 1);
  }

  Truck truck(int number) {
    return trucks.get(number);
  }

  /** Whether the truck gets through the gate of the stop, with what is ordered there. */
  boolean fits(int truck, int stop) {
    return stop == 0
        || (order(stop).gate() >= truck(truck).size()
            && order(stop).pallets() <= truck(truck).pallets());
  }

  /** How long a truck stands at the stop. */
  int unloading(int stop) {
    return stop == 0 ? 0 : order(stop).unloading();
  }

  /** The stops whose orders no carrier takes, then the others by the carrier's fee, falling. */
  List<Integer> dearestFirst() {
    Comparator<Integer> byFee =
        Comparator.comparing((Integer stop) -> !order(stop).isOurs())
            .thenComparing(stop -> -order(stop).carrier());
    return stops().boxed().sorted(byFee).toList();
  }

  /** Quarters from beginning to unload at one stop to being at the next. */
  int between(int stop, int next) {
    return unloading(stop) + times.get(stop, next);
  }
}
