package steelyard.variants.catalog.dispatch;

/**
 * What a builders' yard has ordered. Times are quarters of an hour since the shift began.
 *
 * @param pallets at least 1
 * @param gate the largest size of truck that gets in
 * @param opens when unloading can begin at the earliest
 * @param closes when it must have begun
 * @param unloading how long it takes
 * @param carrier what the hired carrier takes; 0 where a truck of the works must go
 */
record Order(int pallets, int gate, int opens, int closes, int unloading, int carrier) {
  Order {
    if (pallets < 1 || closes < opens) {
      throw new IllegalArgumentException(pallets + " pallets from " + opens + " to " + closes);
    }
  }

  /** Whether no carrier takes it. */
  boolean isOurs() {
    return carrier == 0;
  }
}
