package steelyard.harness.sweep;

import java.util.Objects;

/** What can be deployed: a variant on a backend with a setting. */
public record Candidate(Variant variant, Setup setup) {

  public Candidate {
    Objects.requireNonNull(variant, "variant");
    Objects.requireNonNull(setup, "setup");
  }

  /** {@code VARIANT on NAME} or {@code VARIANT on NAME/SETTING}. */
  public String name() {
    return variant.name() + " on " + setup.name();
  }

  @Override
  public String toString() {
    return name();
  }
}
