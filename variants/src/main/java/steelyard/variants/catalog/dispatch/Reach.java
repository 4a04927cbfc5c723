package steelyard.variants.catalog.dispatch;

/**
 * When a truck can be where at all, on the shortest ways: the reductions of Desrochers, Desrosiers
 * &amp; Solomon (1992), "A New Optimization Algorithm for the Vehicle Routing Problem with Time
 * Windows", Operations Research 40(2):342-354, section 5.
 */
final class Reach {
  private final Dispatch day;
  private final Legs shortest;

  Reach(Dispatch day) {
    this.day = day;
    this.shortest = day.times().shortest();
  }

  /** No truck begins at the stop before. */
  int earliest(int stop) {
    return stop == 0 ? 0 : Math.max(day.order(stop).opens(), shortest.get(0, stop));
  }

  /** The truck begins at the stop by then, or is late there or at the works. */
  int latest(int truck, int stop) {
    int shift = day.truck(truck).shift();
    return stop == 0
        ? shift
        : Math.min(day.order(stop).closes(), shift - day.unloading(stop) - shortest.get(stop, 0));
  }

  /** Whether the truck can call at the stop at all. */
  boolean canCall(int truck, int stop) {
    return day.fits(truck, stop) && earliest(stop) <= latest(truck, stop);
  }

  /** Whether the truck can drive straight from one stop to the other. */
  boolean canDrive(int truck, int from, int to) {
    return canBeBefore(truck, from, to, day.between(from, to));
  }

  /** Whether one truck can call at both stops, in some order, with others between. */
  boolean canBeTogether(int truck, int one, int other) {
    return canBeBefore(truck, one, other, day.unloading(one) + shortest.get(one, other))
        || canBeBefore(truck, other, one, day.unloading(other) + shortest.get(other, one));
  }

  private boolean canBeBefore(int truck, int from, int to, int between) {
    return pallets(from) + pallets(to) <= day.truck(truck).pallets()
        && canCall(truck, from)
        && canCall(truck, to)
        && earliest(from) + between <= latest(truck, to);
  }

  private long pallets(int stop) {
    return stop == 0 ? 0 : day.order(stop).pallets();
  }
}
