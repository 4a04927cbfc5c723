package steelyard.results.ledger;

import java.util.Collections;
import java.util.SortedMap;
import java.util.SortedSet;
import java.util.TreeMap;
import java.util.TreeSet;

/** Immutable copies in natural order, so that equal content is written alike. */
final class Sorted {

  private Sorted() {}

  static <K extends Comparable<K>, V> SortedMap<K, V> copy(String what, SortedMap<K, V> map) {
    SortedMap<K, V> copy = new TreeMap<>();
    copy.putAll(Text.require(what, map));
    return Collections.unmodifiableSortedMap(copy);
  }

  static <E extends Comparable<E>> SortedSet<E> copy(String what, SortedSet<E> set) {
    SortedSet<E> copy = new TreeSet<>();
    copy.addAll(Text.require(what, set));
    return Collections.unmodifiableSortedSet(copy);
  }
}
