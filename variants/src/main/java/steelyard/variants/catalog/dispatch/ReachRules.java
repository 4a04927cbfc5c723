package steelyard.variants.catalog.dispatch;

import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints that rule out what no truck can do in time. */
final class ReachRules {
  private ReachRules() {}

  /** A way that no truck can drive in time or with both orders on it is not driven. */
  static void impossibleWays(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Reach reach = new Reach(day);
    Group group = change.group("no way that cannot be");
    day.truckNumbers()
        .forEach(
            truck -> {
              for (int from = 0; from <= day.orders().size(); from++) {
                for (int to = 0; to <= day.orders().size(); to++) {
                  boolean isThere = from != to && day.fits(truck, from) && day.fits(truck, to);
                  if (isThere && !reach.canDrive(truck, from, to)) {
                    group.post(tours.next(truck, from).ne(to));
                  }
                }
              }
            });
  }

  /** Where a truck calls, it begins no earlier than it can be there, and can be back in time. */
  static void reachableTimes(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Reach reach = new Reach(day);
    Group group = change.group("begun when a truck can be there");
    day.stops()
        .forEach(
            stop -> {
              Order order = day.order(stop);
              if (reach.earliest(stop) > order.opens()) {
                group.post(
                    tours.calling(stop).le(0).or(tours.begin(stop).ge(reach.earliest(stop))));
              }
              day.truckNumbers()
                  .filter(truck -> day.fits(truck, stop))
                  .filter(truck -> reach.latest(truck, stop) < order.closes())
                  .forEach(
                      truck ->
                          group.post(
                              tours
                                  .isThere(truck, stop)
                                  .implies(tours.begin(stop).le(reach.latest(truck, stop)))));
            });
  }

  /** Two orders that cannot be on one tour, in either order, are not. */
  static void neverTogether(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Reach reach = new Reach(day);
    Group group = change.group("not both on one tour");
    day.truckNumbers()
        .forEach(
            truck -> {
              for (int one = 1; one <= day.orders().size(); one++) {
                for (int other = one + 1; other <= day.orders().size(); other++) {
                  boolean isThere = day.fits(truck, one) && day.fits(truck, other);
                  if (isThere && !reach.canBeTogether(truck, one, other)) {
                    group.post(
                        tours.isThere(truck, one).not().or(tours.isThere(truck, other).not()));
                  }
                }
              }
            });
  }
}
