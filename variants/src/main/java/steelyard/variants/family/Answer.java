package steelyard.variants.family;

import java.util.Collections;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A solution by the names of the plain model's variables, decided and defined.
 *
 * @param values by name
 * @param objective what the model says it is worth; empty without an objective
 */
public record Answer(SortedMap<String, Integer> values, OptionalLong objective) {
  public Answer {
    values = Collections.unmodifiableSortedMap(new TreeMap<>(values));
  }

  /**
   * The value of the variable of that name.
   *
   * @throws IllegalArgumentException if the answer has none
   */
  public int value(String name) {
    Integer value = values.get(name);
    if (value == null) {
      throw new IllegalArgumentException("the answer has no variable '" + name + "'");
    }
    return value;
  }
}
