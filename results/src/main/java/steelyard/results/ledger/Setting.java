package steelyard.results.ledger;

import java.util.SortedMap;

/**
 * A named set of a backend's options.
 *
 * @param name the setting's name
 * @param options every option with the value in force, defaults included
 */
public record Setting(String name, SortedMap<String, String> options) {
  public Setting {
    Text.requireName("setting name", name);
    options = Sorted.copy("options", options);
  }
}
