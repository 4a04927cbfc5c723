package steelyard.adapters.sat;

import java.util.List;
import java.util.Optional;
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

/**
 * Clauses by the order encoding, solved by Sat4j; an objective is improved until nothing better is
 * possible.
 */
public final class SatBackend implements Backend {
  static final String SOLVER = "solver";
  static final String MOST_VARIABLES = "max-variables";
  static final String MOST_CLAUSES = "max-clauses";
  static final String MOST_EDGES = "diagram-edges";
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
        List.of(
            Setting.choice(SOLVER, SOLVERS, "configuration of the solver"),
            Setting.integer(
                MOST_VARIABLES,
                10_000_000,
                1,
                1_000_000_000,
                "refuse more propositional variables"),
            Setting.integer(MOST_CLAUSES, 30_000_000, 1, 1_000_000_000_000L, "refuse more clauses"),
            Setting.integer(
                MOST_EDGES,
                20_000,
                0,
                1_000_000_000,
                "encode sums whose diagram would have more edges as binary numbers")),
        0.85);
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
