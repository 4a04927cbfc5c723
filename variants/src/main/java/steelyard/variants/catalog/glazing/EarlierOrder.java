package steelyard.variants.catalog.glazing;

import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.variants.family.Answer;

/**
 * What is left of an earlier order of tiles: its tiles one after the other, without those that are
 * not ordered now. A kind is known by what it needs and its glaze.
 */
final class EarlierOrder {
  private final GlazeLine before;
  private final GlazeLine now;
  private final int[] left;

  private EarlierOrder(GlazeLine before, GlazeLine now) {
    this.before = before;
    this.now = now;
    this.left = now.kinds().stream().mapToInt(Kind::tiles).toArray();
  }

  /** Kinds of the first slots; the others are left open. */
  static SortedMap<String, Integer> hint(GlazeLine before, Answer plan, GlazeLine now) {
    EarlierOrder earlier = new EarlierOrder(before, now);
    SortedMap<String, Integer> hint = new TreeMap<>();
    for (int slot = 0; slot < before.slots(); slot++) {
      earlier
          .take(plan.value(Names.kind(slot)))
          .ifPresent(kind -> hint.put(Names.kind(hint.size()), kind));
    }
    return hint;
  }

  /** A kind of now like the earlier one, of which a tile is left. */
  private Optional<Integer> take(int earlierKind) {
    Optional<Integer> kind =
        IntStream.range(0, left.length)
            .filter(k -> left[k] > 0)
            .filter(k -> isLike(before.kinds().get(earlierKind), now.kinds().get(k)))
            .boxed()
            .findFirst();
    kind.ifPresent(k -> left[k]--);
    return kind;
  }

  private static boolean isLike(Kind one, Kind other) {
    return one.treatments().equals(other.treatments()) && one.glaze() == other.glaze();
  }
}
