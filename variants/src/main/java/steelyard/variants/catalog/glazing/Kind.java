package steelyard.variants.catalog.glazing;

import steelyard.variants.model.Ints;

/**
 * Tiles that are alike.
 *
 * @param tiles how many are ordered
 * @param treatments which ones they need, by number, ascending
 * @param glaze by number
 */
record Kind(int tiles, Ints treatments, int glaze) {
  Kind {
    if (tiles < 0 || glaze < 0) {
      throw new IllegalArgumentException(tiles + " tiles of glaze " + glaze);
    }
  }

  boolean needs(int treatment) {
    return treatments.stream().anyMatch(t -> t == treatment);
  }
}
