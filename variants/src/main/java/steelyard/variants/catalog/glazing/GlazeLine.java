package steelyard.variants.catalog.glazing;

import java.util.List;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;

/**
 * The tiles of a day and what the line can do.
 *
 * @param treatments by number
 * @param kinds by number; together at least one tile and at most {@link Domain#LIMIT}
 * @param changeCost what it costs to change the glaze from one tile to the next
 * @param longestRun at most so many tiles of one glaze in a row
 */
record GlazeLine(List<Treatment> treatments, List<Kind> kinds, int changeCost, int longestRun) {
  GlazeLine {
    treatments = List.copyOf(treatments);
    kinds = List.copyOf(kinds);
    long tiles = kinds.stream().mapToLong(Kind::tiles).sum();
    if (tiles < 1 || tiles > Domain.LIMIT) {
      throw new IllegalArgumentException(tiles + " tiles; at least 1 is needed, at most 10^9 fit");
    }
    if (longestRun < 1 || changeCost < 0) {
      throw new IllegalArgumentException(
          "runs of at most " + longestRun + " tiles, a change at " + changeCost);
    }
  }

  /** How many tiles pass. */
  int slots() {
    return tiles(kind -> true);
  }

  /** How many tiles are of such kinds. */
  int tiles(Predicate<Kind> which) {
    return kinds.stream().filter(which).mapToInt(Kind::tiles).sum();
  }

  Treatment treatment(int number) {
    return treatments.get(number);
  }

  /** The numbers of all treatments that may not be overrun. */
  List<Integer> strictTreatments() {
    return numbers().filter(t -> treatment(t).isStrict()).toList();
  }

  /** The numbers of all treatments that may be overrun at a price. */
  List<Integer> pricedTreatments() {
    return numbers().filter(t -> !treatment(t).isStrict()).toList();
  }

  private Stream<Integer> numbers() {
    return IntStream.range(0, treatments.size()).boxed();
  }

  /** The kinds that need the treatment. */
  Ints kindsWith(int treatment) {
    return Ints.of(
        IntStream.range(0, kinds.size()).filter(k -> kinds.get(k).needs(treatment)).toArray());
  }

  /** How many tiles need the treatment. */
  int tilesWith(int treatment) {
    return tiles(kind -> kind.needs(treatment));
  }

  /** The treatment's windows: full ones, or all the tiles where they are fewer. */
  List<Window> windows(int treatment) {
    int length = Math.min(treatment(treatment).window(), slots());
    if (length <= treatment(treatment).most()) {
      return List.of();
    }
    return IntStream.rangeClosed(0, slots() - length)
        .mapToObj(first -> new Window(first, first + length))
        .toList();
  }

  /** Glaze by kind. */
  Ints glazes() {
    return Ints.of(kinds.stream().mapToInt(Kind::glaze).toArray());
  }

  /** Whether it is of any interest which tile has which glaze. */
  boolean hasGlazes() {
    return changeCost > 0 || longestRun < slots();
  }

  /** Whether there is something to pay, and so to minimise. */
  boolean hasCost() {
    return changeCost > 0 || treatments.stream().anyMatch(t -> !t.isStrict());
  }
}
