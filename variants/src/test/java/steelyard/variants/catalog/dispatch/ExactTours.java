package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;

/**
 * The least cost of a day, by dynamic programming that knows nothing of constraint models: for each
 * truck the cheapest tour over each set of stops, by labels of time and cost (Desrochers,
 * Desrosiers &amp; Solomon 1992, Operations Research 40(2):342-354, section 4), then sets of stops
 * shared out truck by truck.
 */
final class ExactTours {
  private final Dispatch day;
  private final int stops;

  private ExactTours(Dispatch day) {
    this.day = day;
    this.stops = day.orders().size();
  }

  /** Where a partial tour is: which stops it has called at, and which of them last. */
  private record State(int called, int last) {}

  /** When unloading begins at the last stop, and what the way there has cost. */
  private record Label(int begin, long cost) {}

  /** Empty where a day has no plan. */
  static OptionalLong leastCost(Dispatch day) {
    ExactTours exact = new ExactTours(day);
    Map<Truck, Map<Integer, Long>> tours = new HashMap<>();
    Map<Integer, Long> shared = new HashMap<>(Map.of(0, 0L));
    for (Truck truck : day.trucks()) {
      shared = join(shared, tours.computeIfAbsent(truck, exact::cheapestTours));
    }
    return shared.entrySet().stream()
        .filter(entry -> exact.carriersCanTakeAllBut(entry.getKey()))
        .mapToLong(entry -> entry.getValue() + exact.feesOfAllBut(entry.getKey()))
        .min();
  }

  private static Map<Integer, Long> join(Map<Integer, Long> shared, Map<Integer, Long> tours) {
    Map<Integer, Long> joined = new HashMap<>();
    shared.forEach(
        (called, cost) ->
            tours.forEach(
                (tour, price) -> {
                  if ((called & tour) == 0) {
                    joined.merge(called | tour, cost + price, Math::min);
                  }
                }));
    return joined;
  }

  private Map<Integer, Long> cheapestTours(Truck truck) {
    Map<Integer, Long> cheapest = new HashMap<>(Map.of(0, 0L));
    Map<State, List<Label>> level = new HashMap<>();
    for (int stop = 1; stop <= stops; stop++) {
      extend(truck, new State(0, 0), new Label(0, truck.cost()), stop, level);
    }
    while (!level.isEmpty()) {
      Map<State, List<Label>> next = new HashMap<>();
      level.forEach(
          (state, labels) ->
              undominated(labels)
                  .forEach(
                      label -> {
                        home(truck, state, label, cheapest);
                        for (int stop = 1; stop <= stops; stop++) {
                          extend(truck, state, label, stop, next);
                        }
                      }));
      level = next;
    }
    return cheapest;
  }

  private void extend(Truck truck, State at, Label label, int stop, Map<State, List<Label>> level) {
    Order order = day.order(stop);
    int called = at.called | bit(stop);
    int begin = Math.max(order.opens(), label.begin + day.between(at.last, stop));
    if (called != at.called
        && order.gate() >= truck.size()
        && begin <= order.closes()
        && load(called) <= truck.pallets()) {
      long cost = label.cost + day.costs().get(at.last, stop);
      level
          .computeIfAbsent(new State(called, stop), state -> new ArrayList<>())
          .add(new Label(begin, cost));
    }
  }

  private void home(Truck truck, State at, Label label, Map<Integer, Long> cheapest) {
    if (label.begin + day.between(at.last, 0) <= truck.shift()) {
      cheapest.merge(at.called, label.cost + day.costs().get(at.last, 0), Math::min);
    }
  }

  /** Those that no other is both sooner and cheaper than. */
  private static List<Label> undominated(List<Label> labels) {
    labels.sort(Comparator.comparingInt(Label::begin).thenComparingLong(Label::cost));
    List<Label> kept = new ArrayList<>();
    long cheapest = Long.MAX_VALUE;
    for (Label label : labels) {
      if (label.cost < cheapest) {
        kept.add(label);
        cheapest = label.cost;
      }
    }
    return kept;
  }

  private int load(int called) {
    return day.stops()
        .filter(stop -> (called & bit(stop)) != 0)
        .map(stop -> day.order(stop).pallets())
        .sum();
  }

  private boolean carriersCanTakeAllBut(int called) {
    return day.stops().allMatch(stop -> (called & bit(stop)) != 0 || !day.order(stop).isOurs());
  }

  private long feesOfAllBut(int called) {
    return day.stops()
        .filter(stop -> (called & bit(stop)) == 0)
        .mapToLong(stop -> day.order(stop).carrier())
        .sum();
  }

  private static int bit(int stop) {
    return 1 << stop;
  }
}
