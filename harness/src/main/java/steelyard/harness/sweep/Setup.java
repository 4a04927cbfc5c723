package steelyard.harness.sweep;

import java.util.Objects;
import steelyard.results.ledger.BackendBuild;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.Setting;

/**
 * A backend with one of its settings and what its runs are allowed.
 *
 * @param backend under the name that the sweep file gives it
 * @param setting every option with its value in force
 * @param threads what the solver is given; as many cores are held; at least 1
 * @param limits what each run is allowed
 */
public record Setup(BackendBuild backend, Setting setting, int threads, Limits limits) {
  public Setup {
    Objects.requireNonNull(backend, "backend");
    Objects.requireNonNull(setting, "setting");
    Objects.requireNonNull(limits, "limits");
    if (threads < 1) {
      throw new IllegalArgumentException("threads must be at least 1, was " + threads);
    }
  }

  /** {@code NAME}, with {@code /SETTING} unless it is the default one. */
  public String name() {
    return setting.name().equals(Observation.DEFAULT_SETTING)
        ? backend.name()
        : backend.name() + "/" + setting.name();
  }
}
