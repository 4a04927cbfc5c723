package steelyard.variants.catalog.dispatch;

import java.util.SortedMap;
import java.util.TreeMap;

/** Numbers that say what is particular about a day. */
final class DayFeatures {
  private DayFeatures() {}

  static SortedMap<String, Double> of(Dispatch day) {
    SortedMap<String, Double> features = new TreeMap<>();
    double orders = day.orders().size();
    double trucks = day.trucks().size();
    double pallets = day.orders().stream().mapToInt(Order::pallets).sum();
    features.put("orders", orders);
    features.put("trucks", trucks);
    features.put("truck-types", (double) day.trucks().stream().distinct().count());
    features.put("like-orders", (double) likeOrders(day));
    features.put("load", pallets / day.trucks().stream().mapToInt(Truck::pallets).sum());
    features.put("mean-opening", meanOpening(day));
    features.put("ours-share", day.orders().stream().filter(Order::isOurs).count() / orders);
    features.put("entry-share", entries(day) / (orders * trucks));
    features.put("fee-of-a-trip-alone", feeOfATripAlone(day));
    return features;
  }

  private static long likeOrders(Dispatch day) {
    return day.stops()
        .filter(stop -> day.stops().anyMatch(s -> s < stop && Preferences.areAlike(s, stop, day)))
        .count();
  }

  /** Mean time in which unloading can begin, of the longest shift. */
  private static double meanOpening(Dispatch day) {
    double open =
        day.orders().stream().mapToInt(order -> order.closes() - order.opens()).average().orElse(0);
    return open / Math.max(1, day.trucks().stream().mapToInt(Truck::shift).max().orElse(1));
  }

  private static long entries(Dispatch day) {
    return day.truckNumbers()
        .mapToLong(truck -> day.stops().filter(stop -> day.fits(truck, stop)).count())
        .sum();
  }

  /** Mean fee of a carrier, of what the ways there and back cost. */
  private static double feeOfATripAlone(Dispatch day) {
    return day.stops()
        .filter(stop -> !day.order(stop).isOurs())
        .mapToDouble(
            stop ->
                day.order(stop).carrier()
                    / Math.max(1.0, (double) day.costs().get(0, stop) + day.costs().get(stop, 0)))
        .average()
        .orElse(0);
  }
}
