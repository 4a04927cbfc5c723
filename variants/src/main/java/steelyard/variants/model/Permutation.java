package steelyard.variants.model;

import java.util.Collections;
import java.util.HashSet;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A renaming of decision variables by name; a variable that is not named stays.
 *
 * @param images from each moved variable to the one that takes its place; a bijection
 */
public record Permutation(SortedMap<String, String> images) {
  public Permutation {
    images = Collections.unmodifiableSortedMap(new TreeMap<>(images));
    if (!new HashSet<>(images.values()).equals(images.keySet())) {
      throw new IllegalArgumentException("not a permutation of its variables: " + images);
    }
  }

  public static Permutation of(Map<String, String> images) {
    return new Permutation(new TreeMap<>(images));
  }

  /** The permutation that exchanges two variables and moves no other. */
  public static Permutation swap(String one, String other) {
    return of(Map.of(one, other, other, one));
  }
}
