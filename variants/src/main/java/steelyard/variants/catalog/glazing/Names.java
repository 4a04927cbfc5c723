package steelyard.variants.catalog.glazing;

/** What the plain model calls its variables and groups. */
final class Names {
  static final String DEMAND = "as many of each kind as ordered";
  static final String CAPACITY = "no window with too many";
  static final String RUNS = "no run of one glaze too long";

  private Names() {}

  /** The kind of the tile in {@code slot}. */
  static String kind(int slot) {
    return "kind[" + slot + "]";
  }

  /** Whether the tile in {@code slot} needs the treatment. */
  static String needs(int treatment, int slot) {
    return "needs[" + treatment + "." + slot + "]";
  }

  /** Whether the treatment's window that starts at {@code slot} has too many. */
  static String over(int treatment, int slot) {
    return "over[" + treatment + "." + slot + "]";
  }

  /** The glaze of the tile in {@code slot}. */
  static String glaze(int slot) {
    return "glaze[" + slot + "]";
  }

  /** Whether the tile in {@code slot} has another glaze than the one before it. */
  static String change(int slot) {
    return "change[" + slot + "]";
  }
}
