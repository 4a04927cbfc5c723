package steelyard.variants.catalog.kilns;

import java.util.OptionalInt;

/**
 * Tiles that are fired together.
 *
 * @param shelves that they fill, at least 1
 * @param large whether they need wide shelves
 * @param coolest the lowest heat at which their glaze matures
 * @param hottest the highest heat that it bears
 * @param glaze index of the glaze family
 * @param dry the first day on which the glaze is dry enough to fire
 * @param due the day by which they should be out
 * @param rate what each day after that costs
 * @param latest the day by which they must be out, if there is one
 */
record Lot(
    String name,
    int shelves,
    boolean large,
    int coolest,
    int hottest,
    int glaze,
    int dry,
    int due,
    int rate,
    OptionalInt latest) {

  boolean maturesAt(int heat) {
    return coolest <= heat && heat <= hottest;
  }

  /** Whether nothing but the name tells it from {@code other}. */
  boolean isLike(Lot other) {
    return named(other.name).equals(other);
  }

  Lot named(String other) {
    return new Lot(other, shelves, large, coolest, hottest, glaze, dry, due, rate, latest);
  }

  Lot withLatest(OptionalInt day) {
    return new Lot(name, shelves, large, coolest, hottest, glaze, dry, due, rate, day);
  }
}
