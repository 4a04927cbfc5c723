package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * Small days by seed, few enough stops to try every plan: ways that take no time or are no shortest
 * ones, gates too narrow, trucks and orders that are alike, days without a plan.
 */
final class RandomDay {
  private RandomDay() {}

  /**
   * A day of up to so many orders.
   *
   * @param orders at most
   * @param trucks at most
   */
  static Dispatch of(long seed, int orders, int trucks) {
    SplittableRandom random = new SplittableRandom(seed);
    int stops = random.nextInt(1, orders + 1);
    List<Truck> fleet = new ArrayList<>();
    for (int t = random.nextInt(1, trucks + 1); t > 0; t--) {
      boolean isAlike = !fleet.isEmpty() && random.nextBoolean();
      fleet.add(isAlike ? fleet.get(0) : truck(random));
    }
    int twinOf = stops > 1 && random.nextInt(3) == 0 ? random.nextInt(1, stops) : 0;
    List<Order> ordered = new ArrayList<>();
    for (int stop = 1; stop <= stops; stop++) {
      ordered.add(twinOf > 0 && stop == twinOf + 1 ? ordered.get(stop - 2) : order(random));
    }
    int least = random.nextInt(3) == 0 ? 0 : 1;
    return new Dispatch(
        fleet, ordered, legs(stops, twinOf, random, least, 5), legs(stops, twinOf, random, 0, 10));
  }

  private static Truck truck(SplittableRandom random) {
    return new Truck(
        random.nextInt(3, 9), random.nextInt(3), random.nextInt(6, 14), random.nextInt(5));
  }

  private static Order order(SplittableRandom random) {
    int opens = random.nextInt(6);
    return new Order(
        random.nextInt(1, 5),
        random.nextInt(4),
        opens,
        opens + random.nextInt(3),
        random.nextInt(2),
        random.nextInt(4) == 0 ? 0 : random.nextInt(1, 15));
  }

  /** The stop after {@code twinOf} lies where that one does, if there is one. */
  private static Legs legs(int stops, int twinOf, SplittableRandom random, int least, int most) {
    int[][] rows = new int[stops + 1][stops + 1];
    for (int from = 0; from <= stops; from++) {
      for (int to = 0; to <= stops; to++) {
        rows[from][to] = from == to ? 0 : random.nextInt(least, most);
      }
    }
    if (twinOf > 0) {
      int twin = twinOf + 1;
      rows[twin][twinOf] = rows[twinOf][twin];
      for (int stop = 0; stop <= stops; stop++) {
        if (stop != twinOf && stop != twin) {
          rows[twin][stop] = rows[twinOf][stop];
          rows[stop][twin] = rows[stop][twinOf];
        }
      }
    }
    return new Legs(IntStream.rangeClosed(0, stops).mapToObj(s -> Ints.of(rows[s])).toList());
  }
}
