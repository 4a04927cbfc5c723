package steelyard.variants.catalog.kilns;

import java.util.List;
import steelyard.variants.model.Ints;

/**
 * A kiln.
 *
 * @param shelves how many it has
 * @param wide how many of them have the height that large tiles need
 * @param hottest the highest heat that its lining bears
 * @param set the heat that it was last fired at
 * @param mass what changing its temperature costs, as a multiple of the works' table
 * @param firings at most so many in the campaign
 * @param hot at most so many of them at its hottest heat, before it is relined
 * @param fuel of a firing, by heat from 1 to {@code hottest}
 * @param repairs in order of time, apart from each other
 */
record Kiln(
    String name,
    int shelves,
    int wide,
    int hottest,
    int set,
    int mass,
    int firings,
    int hot,
    Ints fuel,
    List<Repair> repairs) {
  Kiln {
    repairs = List.copyOf(repairs);
  }

  /**
   * Days {@code from}, inclusive, to {@code until}, exclusive, on which the kiln is taken apart.
   */
  record Repair(int from, int until) {
    int days() {
      return until - from;
    }
  }

  int fuelAt(int heat) {
    return fuel.get(heat - 1);
  }

  /** Whether nothing but the name tells it from {@code other}. */
  boolean isLike(Kiln other) {
    return named(other.name).equals(other);
  }

  Kiln named(String other) {
    return new Kiln(other, shelves, wide, hottest, set, mass, firings, hot, fuel, repairs);
  }

  Kiln withFirings(int most, int mostHot) {
    return new Kiln(name, shelves, wide, hottest, set, mass, most, mostHot, fuel, repairs);
  }

  Kiln withRepairs(List<Repair> others) {
    return new Kiln(name, shelves, wide, hottest, set, mass, firings, hot, fuel, others);
  }
}
