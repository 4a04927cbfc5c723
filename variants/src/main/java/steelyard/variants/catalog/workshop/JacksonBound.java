package steelyard.variants.catalog.workshop;

import java.util.Comparator;
import java.util.List;
import java.util.PriorityQueue;

/**
 * How long every plan lasts at least, seen from one station: the length of Jackson's preemptive
 * schedule, in which the station always works on the mould at hand with the longest tail and may
 * put it aside. It equals the maximum over all sets of the station's visits of smallest head + sum
 * of minutes + smallest tail. Cost: O(n log n).
 *
 * @see <a href="https://doi.org/10.1016/S0377-2217(82)80007-6">Carlier (1982), "The one-machine
 *     sequencing problem", EJOR 11(1):42-47</a>
 */
final class JacksonBound {
  private final PriorityQueue<Piece> waiting =
      new PriorityQueue<>(Comparator.comparingInt(Piece::tail).reversed());
  private int now;
  private int latest;

  private JacksonBound() {}

  /** What is left of a visit. */
  private record Piece(int minutes, int tail) {}

  /** The bound in minutes; 0 for no visits. */
  static int of(List<Visit> visits) {
    JacksonBound bound = new JacksonBound();
    List<Visit> byHead = visits.stream().sorted(Comparator.comparingInt(Visit::head)).toList();
    for (Visit visit : byHead) {
      bound.workUntil(visit.head());
      bound.waiting.add(new Piece(visit.minutes(), visit.tail()));
    }
    bound.workUntil(Integer.MAX_VALUE);
    return bound.latest;
  }

  private void workUntil(int time) {
    while (now < time && !waiting.isEmpty()) {
      Piece piece = waiting.remove();
      int worked = Math.min(piece.minutes, time - now);
      now += worked;
      if (worked < piece.minutes) {
        waiting.add(new Piece(piece.minutes - worked, piece.tail));
      } else {
        latest = Math.max(latest, now + piece.tail);
      }
    }
    now = Math.max(now, time);
  }
}
