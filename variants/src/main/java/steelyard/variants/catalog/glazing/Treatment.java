package steelyard.variants.catalog.glazing;

/**
 * Something that some tiles get: of any {@code window} tiles in a row at most {@code most} may need
 * it.
 *
 * @param most at least 1, at most {@code window}
 * @param excess what each window with more costs; 0 where none may have more
 */
record Treatment(int most, int window, int excess) {
  Treatment {
    if (most < 1 || most > window || excess < 0) {
      throw new IllegalArgumentException(
          "at most " + most + " of " + window + " tiles, or " + excess + " to pay");
    }
  }

  /** Whether no window may have more. */
  boolean isStrict() {
    return excess == 0;
  }

  /** The most tiles that can get it among {@code tiles} in a row, if no window has too many. */
  int mostAmong(int tiles) {
    return tiles / window * most + Math.min(most, tiles % window);
  }
}
