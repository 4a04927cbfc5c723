package steelyard.harness.sweep;

import java.util.List;
import java.util.Objects;

/**
 * What can be deployed: a variant on a backend with a setting.
 *
 * @param amendments in the order in which they apply; empty for the plain model
 */
public record Candidate(List<String> amendments, Setup setup) {

  /** The variant without amendments. */
  public static final String PLAIN = "plain";

  public Candidate {
    amendments = List.copyOf(amendments);
    Objects.requireNonNull(setup, "setup");
  }

  /** The variant's name: {@code plain}, {@code plain+load-bound}. */
  public String variant() {
    return variant(amendments);
  }

  static String variant(List<String> amendments) {
    return amendments.isEmpty() ? PLAIN : PLAIN + "+" + String.join("+", amendments);
  }

  /** {@code VARIANT on NAME} or {@code VARIANT on NAME/SETTING}. */
  public String name() {
    return variant() + " on " + setup.name();
  }

  @Override
  public String toString() {
    return name();
  }
}
