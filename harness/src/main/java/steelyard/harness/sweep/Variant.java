package steelyard.harness.sweep;

import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * The plain model of a family with some amendments.
 *
 * @param amendments in the order in which they apply; empty for the plain model
 * @param alias names the family's code where several versions of it stand side by side
 */
public record Variant(List<String> amendments, Optional<String> alias) {

  /** The variant without amendments. */
  public static final String PLAIN = "plain";

  /** Stands between the variant and the alias. */
  static final char AT = '@';

  public Variant {
    amendments = List.copyOf(amendments);
    Objects.requireNonNull(alias, "alias");
  }

  /** Of a family of which there is one version. */
  public static Variant of(List<String> amendments) {
    return new Variant(amendments, Optional.empty());
  }

  /** {@code plain}, {@code plain+load-bound}, {@code plain+load-bound@old}. */
  public String name() {
    String name = amendments.isEmpty() ? PLAIN : PLAIN + "+" + String.join("+", amendments);
    return alias.map(version -> name + AT + version).orElse(name);
  }

  @Override
  public String toString() {
    return name();
  }
}
