package steelyard.variants.catalog.glazing;

import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.DoubleStream;

/** Numbers that say what is particular about a line. */
final class LineFeatures {
  private LineFeatures() {}

  static SortedMap<String, Double> of(GlazeLine line) {
    SortedMap<String, Double> features = new TreeMap<>();
    features.put("tiles", (double) line.slots());
    features.put("kinds", (double) line.kinds().size());
    features.put("largest-kind", line.kinds().stream().mapToInt(Kind::tiles).max().orElse(0) * 1.0);
    features.put("strict-treatments", (double) line.strictTreatments().size());
    features.put("strict-load", loads(line, line.strictTreatments()).average().orElse(0));
    features.put("largest-strict-load", loads(line, line.strictTreatments()).max().orElse(0));
    features.put("priced-treatments", (double) line.pricedTreatments().size());
    features.put("priced-load", loads(line, line.pricedTreatments()).average().orElse(0));
    features.put("needs-of-a-tile", needsOfATile(line));
    features.put(
        "glazes", line.hasGlazes() ? (double) line.glazes().stream().distinct().count() : 0);
    features.put("change-cost", (double) line.changeCost());
    return features;
  }

  /** Tiles that need each treatment, of those that can get it if no window has too many. */
  private static DoubleStream loads(GlazeLine line, List<Integer> treatments) {
    return treatments.stream()
        .mapToDouble(t -> line.tilesWith(t) / (double) line.treatment(t).mostAmong(line.slots()));
  }

  private static double needsOfATile(GlazeLine line) {
    long needs =
        line.kinds().stream().mapToLong(k -> (long) k.tiles() * k.treatments().size()).sum();
    return needs / (double) line.slots();
  }
}
