package steelyard.variants.catalog.kilns;

/** Indices of two lots, or of two glazes. */
record Pair(int one, int other) {
  boolean isOf(int a, int b) {
    return (one == a && other == b) || (one == b && other == a);
  }
}
