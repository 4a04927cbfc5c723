package steelyard.harness.sweep;

import java.util.Objects;
import java.util.SortedMap;
import steelyard.adapters.spi.Setting;
import steelyard.results.ledger.Digest;

/** Says which build of a backend runs under its options: an option may name a solver program. */
@FunctionalInterface
public interface Builds {
  /** Every backend as the catalogue describes it, whatever its options name. */
  Builds DESCRIBED = (backend, options) -> new Build(backend.version(), backend.code());

  /**
   * The build that runs.
   *
   * @param options a value for every option
   * @throws IllegalArgumentException with one line, if they name a program that cannot be used
   */
  Build of(Catalogue.Backend backend, SortedMap<String, String> options);

  /** Whether a backend's options name a program. */
  static boolean startsProgram(Catalogue.Backend backend) {
    return backend.settings().stream().anyMatch(s -> s.kind() == Setting.Kind.COMMAND);
  }

  /**
   * A backend in one version.
   *
   * @param version of its solver
   * @param code digest of the adapter's code, its libraries, natives and program
   */
  record Build(String version, Digest code) {
    public Build {
      Objects.requireNonNull(version, "version");
      Objects.requireNonNull(code, "code");
    }
  }
}
