package steelyard.adapters.sat;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Model;

/**
 * Clauses by the order encoding, solved by Sat4j; an objective is improved until nothing better is
 * possible.
 */
public final class SatBackend implements Backend {
  static final String SOLVER = "solver";
  static final String CONFLICTS = "conflicts";

  /**
   * Configurations of the library whose search depends on nothing but the formula. Left out are
   * those that look at free memory or draw random numbers shared by the whole process.
   */
  static final List<String> SOLVERS =
      List.of(
          "glucose21",
          "glucose",
          "best-wl",
          "best-ht",
          "minisat",
          "minilearning",
          "concise",
          "no-simplification",
          "no-restarts");

  private static final Refusal MISSING =
      new Refusal("sat needs the library org.ow2.sat4j.core on the class path");

  @Override
  public Description describe() {
    return new Description(
        "sat",
        "2.3.6",
        false,
        true,
        Set.of(Goal.Satisfy.class, Goal.Optimise.class, Goal.Enumerate.class),
        List.of(CONFLICTS),
        settings(),
        0.85);
  }

  private static List<Setting> settings() {
    List<Setting> settings = new ArrayList<>();
    settings.add(Setting.choice(SOLVER, SOLVERS, "configuration of the solver"));
    settings.addAll(EncodingSettings.declared());
    return settings;
  }

  @Override
  public Optional<Refusal> load() {
    try {
      SatSolver.loadLibrary();
      return Optional.empty();
    } catch (NoClassDefFoundError e) {
      return Optional.of(MISSING);
    }
  }

  @Override
  public Lowered lower(Model model, SolveRequest request, Monitor monitor) {
    if (request.threads() != 1) {
      return new Refusal("sat runs one thread, not " + request.threads());
    }
    try {
      return SatLowering.of(model, request, monitor);
    } catch (NoClassDefFoundError e) {
      return MISSING;
    }
  }
}
