package steelyard.results.ledger;

import java.util.SortedMap;
import java.util.TreeMap;

/** Sorted maps written on one line. */
final class SortedMapOf {

  private SortedMapOf() {}

  static SortedMap<String, String> pairs(String... keysAndValues) {
    SortedMap<String, String> map = new TreeMap<>();
    for (int i = 0; i < keysAndValues.length; i += 2) {
      map.put(keysAndValues[i], keysAndValues[i + 1]);
    }
    return map;
  }

  static SortedMap<String, Long> counters(Object... keysAndValues) {
    SortedMap<String, Long> map = new TreeMap<>();
    for (int i = 0; i < keysAndValues.length; i += 2) {
      map.put((String) keysAndValues[i], (Long) keysAndValues[i + 1]);
    }
    return map;
  }
}
