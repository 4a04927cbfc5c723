package steelyard.variants.catalog.glazing;

/**
 * What a line that is made up is like.
 *
 * @param tiles at least 1
 * @param kinds at most so many
 * @param glazes at least 2, at most {@code kinds}
 * @param changeCost what a change of glaze costs
 * @param longestRun at most so many tiles of one glaze in a row
 * @param strict how many treatments may not be overrun
 * @param priced how many may, at a price
 */
record LineRecipe(
    int tiles, int kinds, int glazes, int changeCost, int longestRun, int strict, int priced) {
  LineRecipe {
    if (tiles < 1 || glazes < 2 || glazes > kinds || strict < 0 || strict + priced < 1) {
      throw new IllegalArgumentException(
          tiles + " tiles of " + kinds + " kinds in " + glazes + " glazes");
    }
  }

  /** Strict treatments alone, and changes of glaze to pay. */
  static LineRecipe changes(int tiles) {
    return new LineRecipe(tiles, 4 + tiles / 6, 4, 1, Math.min(8, 2 + tiles / 10), 4, 0);
  }

  /** Treatments that may be overrun, each at a price of its own. */
  static LineRecipe overruns(int tiles) {
    return new LineRecipe(tiles, 4 + tiles / 6, 2, 0, tiles, 0, 4);
  }

  /** Two of each, and changes of glaze to pay. */
  static LineRecipe mixed(int tiles) {
    return new LineRecipe(tiles, 4 + tiles / 6, 3, 4, Math.min(10, 3 + tiles / 10), 2, 2);
  }

  /** So few tiles that every order can be tried; of each sort on some seed. */
  static LineRecipe smallest(long seed) {
    int tiles = 2 + Math.floorMod(seed, 5);
    return switch (Math.floorMod(seed, 4)) {
      case 0 -> new LineRecipe(tiles, 3, 2, 1, 2, 2, 0);
      case 1 -> new LineRecipe(tiles, 4, 2, 0, tiles, 1, 2);
      case 2 -> new LineRecipe(tiles, 4, 3, 2, 3, 2, 1);
      default -> new LineRecipe(tiles, 3, 2, 0, tiles, 3, 0);
    };
  }
}
