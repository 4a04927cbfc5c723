package steelyard.harness.sweep.text;

import java.util.Collection;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/** The values of one mapping by key, some of which must be there. */
public final class Keys {

  private final Field owner;
  private final Map<String, Field> fields;

  private Keys(Field owner, Map<String, Field> fields) {
    this.owner = owner;
    this.fields = fields;
  }

  /** The keys of {@code owner}; unknown and repeated ones are mistakes. */
  public static Keys of(Field owner, Collection<String> known) {
    return new Keys(owner, owner.entries(known));
  }

  /** The value of a key, if the file has it. */
  public Optional<Field> optional(String key) {
    return Optional.ofNullable(fields.get(key));
  }

  /** The value of a key; if the file lacks it, that is a mistake. */
  public Optional<Field> required(String key, String example) {
    Field field = fields.get(key);
    if (field == null && owner.hasKeys()) {
      owner.mistake("missing key '" + key + "'", "for example: " + example);
    }
    return Optional.ofNullable(field);
  }

  /** The keys that the file has. */
  public Set<String> present() {
    return fields.keySet();
  }
}
