package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import steelyard.variants.family.Answer;

/**
 * What is left of earlier tours: the stops whose orders are there again, in the same order, where
 * the truck can still drive so. Orders and trucks are known by what is said of them.
 */
final class EarlierTours {
  private EarlierTours() {}

  /** Where the trucks that are there again go, and when they unload. */
  static SortedMap<String, Integer> hint(Dispatch before, Answer plan, Dispatch now) {
    List<Optional<Integer>> stops = again(before.orders(), now.orders());
    List<Optional<Integer>> trucks = again(before.trucks(), now.trucks());
    Plan left = Plan.idle(now);
    for (int truck = 0; truck < trucks.size(); truck++) {
      if (trucks.get(truck).isPresent()) {
        List<Integer> tour = new ArrayList<>();
        for (int stop : Plan.tour(before, truck, plan)) {
          stops.get(stop - 1).ifPresent(index -> tour.add(index + 1));
        }
        int today = trucks.get(truck).get();
        left = Plan.begins(now, today, tour).isPresent() ? left.with(today, tour) : left;
      }
    }
    return left.decisions(now);
  }

  /** For each of the earlier ones which of the others is it, none of them twice. */
  private static <T> List<Optional<Integer>> again(List<T> before, List<T> now) {
    List<Optional<Integer>> again = new ArrayList<>();
    boolean[] taken = new boolean[now.size()];
    for (T earlier : before) {
      int found = 0;
      while (found < taken.length && (taken[found] || !now.get(found).equals(earlier))) {
        found++;
      }
      again.add(found < taken.length ? Optional.of(found) : Optional.empty());
      if (found < taken.length) {
        taken[found] = true;
      }
    }
    return again;
  }
}
