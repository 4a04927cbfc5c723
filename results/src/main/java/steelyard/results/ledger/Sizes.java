package steelyard.results.ledger;

import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * How large the lowered model is, by measure (such as {@code clauses}).
 *
 * @param total amounts by measure
 * @param groups amounts by measure, by group name
 */
public record Sizes(
    SortedMap<String, Long> total, SortedMap<String, SortedMap<String, Long>> groups) {
  public Sizes {
    total = Sorted.copy("total", total);
    SortedMap<String, SortedMap<String, Long>> copy = new TreeMap<>();
    Text.require("groups", groups)
        .forEach((name, sizes) -> copy.put(name, Sorted.copy(name, sizes)));
    groups = Collections.unmodifiableSortedMap(copy);
  }
}
