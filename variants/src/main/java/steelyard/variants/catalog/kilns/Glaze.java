package steelyard.variants.catalog.kilns;

import java.util.Locale;

/** A glaze family. */
record Glaze(String name, Kind kind) {
  /** What a glaze does to the kiln that it is fired in, or the kiln to it. */
  enum Kind {
    PLAIN,
    /** Leaves vapours in the lining, which the next firing takes up. */
    FUMING,
    /** Takes up what the firing before left in the lining. */
    PALE;

    /** As instance files have it. */
    String word() {
      return name().toLowerCase(Locale.ROOT);
    }
  }
}
