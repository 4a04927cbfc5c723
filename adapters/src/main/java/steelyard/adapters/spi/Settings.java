package steelyard.adapters.spi;

import java.util.Collections;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A value for every option of one backend.
 *
 * @param values option to text, defaults included: what a run key is made of
 */
public record Settings(SortedMap<String, String> values) {

  public Settings {
    values = Collections.unmodifiableSortedMap(new TreeMap<>(values));
  }

  /**
   * The given values over the backend's defaults.
   *
   * @throws IllegalArgumentException if an option is unknown or a value out of its range
   */
  public static Settings of(Description backend, Map<String, String> given) {
    SortedMap<String, String> values = new TreeMap<>();
    for (Setting setting : backend.settings()) {
      String text = given.getOrDefault(setting.name(), setting.defaultText());
      String mistake = setting.mistakeIn(text);
      if (!mistake.isEmpty()) {
        throw new IllegalArgumentException(
            "setting " + setting.name() + " of " + backend.name() + ": " + mistake);
      }
      values.put(setting.name(), text);
    }
    for (String name : given.keySet()) {
      if (!values.containsKey(name)) {
        throw new IllegalArgumentException(
            backend.name() + " has no setting '" + name + "'; it has " + values.keySet());
      }
    }
    return new Settings(values);
  }

  public boolean flag(String name) {
    return Boolean.parseBoolean(text(name));
  }

  public long integer(String name) {
    return Long.parseLong(text(name));
  }

  public double real(String name) {
    return Double.parseDouble(text(name));
  }

  public String text(String name) {
    String value = values.get(name);
    if (value == null) {
      throw new IllegalArgumentException("no setting '" + name + "' was declared");
    }
    return value;
  }
}
