package steelyard.adapters.spi;

import java.util.Collections;
import java.util.Objects;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.Longs;

/**
 * How large a lowering is.
 *
 * @param totals amounts by name, such as {@code variables} and {@code clauses}
 * @param unit the name in {@code totals} that {@code byPosting} counts
 * @param byPosting amount of {@code unit} by posting id; what no posting made is in none
 * @param how by kind of relation: {@code native}, or the published decomposition or encoding used
 */
public record Sizes(
    SortedMap<String, Long> totals, String unit, Longs byPosting, SortedMap<String, String> how) {
  public Sizes {
    totals = Collections.unmodifiableSortedMap(new TreeMap<>(totals));
    how = Collections.unmodifiableSortedMap(new TreeMap<>(how));
    Objects.requireNonNull(byPosting, "byPosting");
    if (!totals.containsKey(unit)) {
      throw new IllegalArgumentException("no total of '" + unit + "' in " + totals.keySet());
    }
  }
}
