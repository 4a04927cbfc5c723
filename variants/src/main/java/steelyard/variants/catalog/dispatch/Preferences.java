package steelyard.variants.catalog.dispatch;

import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Dominance: what some best plan does not need to do. */
final class Preferences {
  private Preferences() {}

  /**
   * No truck waits before an open yard. Whoever begins earlier is never later anywhere, and what it
   * costs is the same: a semi-active schedule, as Baker (1974), "Introduction to Sequencing and
   * Scheduling", Wiley, calls it.
   */
  static void noWaiting(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group group = change.group("begun as soon as there and open");
    day.truckNumbers()
        .forEach(
            truck -> {
              for (int from = 0; from <= day.orders().size(); from++) {
                for (int to = 1; to <= day.orders().size(); to++) {
                  if (from != to && day.fits(truck, from) && day.fits(truck, to)) {
                    group.post(tours.goes(truck, from, to).implies(isPrompt(from, to, day, tours)));
                  }
                }
              }
            });
  }

  private static Formula isPrompt(int from, int to, Dispatch day, Tours tours) {
    Formula atOpening = tours.begin(to).le(day.order(to).opens());
    Term left = from == 0 ? Term.constant(0) : tours.begin(from);
    return atOpening.or(tours.begin(to).le(left.plus(day.between(from, to))));
  }

  /**
   * Of two orders that nothing tells apart, the one of the lower number is delivered if only one
   * is, and first if both are: they can change places in every plan.
   */
  static void twinOrders(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group group = change.group("like orders by their numbers");
    for (int one = 1; one <= day.orders().size(); one++) {
      for (int other = one + 1; other <= day.orders().size(); other++) {
        if (areAlike(one, other, day)) {
          group.post(tours.calling(other).le(tours.calling(one)));
          group.post(tours.calling(other).le(0).or(tours.begin(one).le(tours.begin(other))));
        }
      }
    }
  }

  static boolean areAlike(int one, int other, Dispatch day) {
    return day.order(one).equals(day.order(other))
        && areAlike(one, other, day.times())
        && areAlike(one, other, day.costs());
  }

  private static boolean areAlike(int one, int other, Legs legs) {
    return legs.get(one, other) == legs.get(other, one)
        && IntStream.range(0, legs.stops())
            .filter(stop -> stop != one && stop != other)
            .allMatch(
                stop ->
                    legs.get(one, stop) == legs.get(other, stop)
                        && legs.get(stop, one) == legs.get(stop, other));
  }

  /**
   * No way leads to or from a stop where the truck's detour costs more than the carrier, whatever
   * stop is on its other side: without the stop the plan would be cheaper, and no truck later.
   */
  static void worthTheWay(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group group = change.group("no detour dearer than the carrier");
    day.stops()
        .filter(stop -> !day.order(stop).isOurs())
        .forEach(
            stop ->
                IntStream.rangeClosed(0, day.orders().size())
                    .filter(neighbour -> neighbour != stop)
                    .forEach(
                        neighbour ->
                            day.truckNumbers()
                                .filter(t -> day.fits(t, stop) && day.fits(t, neighbour))
                                .forEach(
                                    truck -> {
                                      if (!isWorthIt(neighbour, stop, Side.BEFORE, day)) {
                                        group.post(tours.next(truck, neighbour).ne(stop));
                                      }
                                      if (!isWorthIt(neighbour, stop, Side.AFTER, day)) {
                                        group.post(tours.next(truck, stop).ne(neighbour));
                                      }
                                    })));
  }

  private enum Side {
    BEFORE,
    AFTER
  }

  private static boolean isWorthIt(int neighbour, int stop, Side side, Dispatch day) {
    return IntStream.rangeClosed(0, day.orders().size())
        .filter(other -> other != stop && (other != neighbour || other == 0))
        .anyMatch(
            other ->
                side == Side.BEFORE
                    ? isWorthIt(neighbour, stop, other, day)
                    : isWorthIt(other, stop, neighbour, day));
  }

  /** Whether going over the stop may pay, or going straight would take longer. */
  private static boolean isWorthIt(int from, int stop, int to, Dispatch day) {
    int detour =
        day.costs().get(from, stop) + day.costs().get(stop, to) - day.costs().get(from, to);
    int without = day.times().get(from, to);
    int over = day.times().get(from, stop) + day.between(stop, to);
    return detour <= day.order(stop).carrier() || without > over;
  }
}
