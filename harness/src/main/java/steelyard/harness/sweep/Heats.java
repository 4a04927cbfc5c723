package steelyard.harness.sweep;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Which candidates run in the same block?
 *
 * <p>Up to a block's size all do. More are split into heats, the one in service being in each, of
 * sizes as even as may be. Candidates of a pair stay together, since only runs of one block are
 * compared by their times; where a chain of pairs is longer than a block, it is cut. The split is
 * the same for all instances and seeds, so that a pair meets on all of them or on none.
 */
final class Heats {

  private Heats() {}

  /**
   * The heats of a contest, the one in service first in each.
   *
   * @param blockSize at least 2
   */
  static List<List<Candidate>> of(Contest contest, int blockSize) {
    List<Candidate> others = new ArrayList<>(contest.candidates());
    others.remove(contest.inService());
    int room = blockSize - 1;
    List<List<Candidate>> together = cut(together(contest, others), room);
    List<List<Candidate>> heats = new ArrayList<>();
    for (List<Candidate> heat : pack(together, others.size(), room)) {
      List<Candidate> whole = new ArrayList<>();
      whole.add(contest.inService());
      whole.addAll(heat);
      heats.add(List.copyOf(whole));
    }
    return heats.isEmpty() ? List.of(List.of(contest.inService())) : heats;
  }

  /** The sets of candidates that pairs connect, those with nothing in service aside. */
  private static List<List<Candidate>> together(Contest contest, List<Candidate> others) {
    Map<Candidate, List<Candidate>> setOf = new LinkedHashMap<>();
    others.forEach(candidate -> setOf.put(candidate, new ArrayList<>(List.of(candidate))));
    for (Pair pair : contest.pairs()) {
      List<Candidate> a = setOf.get(pair.before());
      List<Candidate> b = setOf.get(pair.after());
      if (a != null && b != null && a != b) {
        a.addAll(b);
        b.forEach(candidate -> setOf.put(candidate, a));
      }
    }
    List<List<Candidate>> sets = new ArrayList<>();
    for (List<Candidate> set : setOf.values()) {
      if (sets.stream().noneMatch(s -> s == set)) {
        sets.add(set);
      }
    }
    sets.forEach(set -> set.sort(Comparator.comparingInt(others::indexOf)));
    return sets;
  }

  private static List<List<Candidate>> cut(List<List<Candidate>> sets, int room) {
    List<List<Candidate>> pieces = new ArrayList<>();
    for (List<Candidate> set : sets) {
      for (int from = 0; from < set.size(); from += room) {
        pieces.add(set.subList(from, Math.min(set.size(), from + room)));
      }
    }
    return pieces;
  }

  /** First fit, with the least capacity that needs no more heats than must be. */
  private static List<List<Candidate>> pack(
      List<List<Candidate>> pieces, int candidates, int room) {
    int fewest = (candidates + room - 1) / room;
    for (int capacity = fewest == 0 ? room : (candidates + fewest - 1) / fewest;
        capacity < room;
        capacity++) {
      Optional<List<List<Candidate>>> packed = firstFit(pieces, capacity);
      if (packed.isPresent() && packed.get().size() == fewest) {
        return packed.get();
      }
    }
    return firstFit(pieces, room).orElseThrow();
  }

  private static Optional<List<List<Candidate>>> firstFit(
      List<List<Candidate>> pieces, int capacity) {
    List<List<Candidate>> heats = new ArrayList<>();
    for (List<Candidate> piece : pieces) {
      if (piece.size() > capacity) {
        return Optional.empty();
      }
      heats.stream()
          .filter(heat -> heat.size() + piece.size() <= capacity)
          .findFirst()
          .ifPresentOrElse(heat -> heat.addAll(piece), () -> heats.add(new ArrayList<>(piece)));
    }
    return Optional.of(heats);
  }
}
