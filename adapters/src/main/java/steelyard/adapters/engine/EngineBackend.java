package steelyard.adapters.engine;

import java.util.List;
import java.util.Set;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Model;

/** The built-in propagator search: depth-first, with restarts and branch and bound. */
public final class EngineBackend implements Backend {
  static final String NAME = "engine";
  static final String VERSION = "0.1.0";

  /** Units of work. */
  static final String FAILURES = "failures";

  static final String DECISIONS = "decisions";

  /** Settings, and the words of those that are choices. */
  static final String BRANCHING = "branching";

  static final String MODEL = "model";
  static final String AUTOMATIC = "automatic";
  static final String RESTARTS = "restarts";
  static final String NEVER = "never";
  static final String LUBY = "luby";
  static final String GEOMETRIC = "geometric";
  static final String SCALE = "restart-scale";
  static final String FACTOR = "restart-factor";
  static final String ALL_DIFFERENT = "all-different";
  static final String BOUNDS = "bounds";
  static final String DOMAIN = "domain";

  /** Everything it needs is on the Java heap. */
  private static final double HEAP_SHARE = 0.85;

  @Override
  public Description describe() {
    return new Description(
        NAME,
        VERSION,
        true,
        true,
        Set.of(Goal.Satisfy.class, Goal.Optimise.class, Goal.Enumerate.class),
        List.of(FAILURES, DECISIONS),
        List.of(
            Setting.choice(
                BRANCHING, List.of(MODEL, AUTOMATIC), "whether to follow the model's branching"),
            Setting.choice(
                RESTARTS,
                List.of(AUTOMATIC, NEVER, LUBY, GEOMETRIC),
                "when to start again; automatic is luby unless a branching is followed"),
            Setting.integer(SCALE, 100, 1, 1_000_000_000, "failures of the shortest run"),
            Setting.real(FACTOR, 1.3, 1.01, 100, "growth of geometric runs"),
            Setting.choice(
                ALL_DIFFERENT, List.of(BOUNDS, DOMAIN), "consistency of all-different relations")),
        HEAP_SHARE);
  }

  @Override
  public Lowered lower(Model model, SolveRequest request, Monitor monitor) {
    if (request.threads() != 1) {
      return new Refusal("engine runs one thread, not " + request.threads());
    }
    return EngineLowering.of(model, request, monitor);
  }
}
