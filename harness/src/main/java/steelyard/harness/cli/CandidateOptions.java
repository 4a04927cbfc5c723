package steelyard.harness.cli;

import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.function.Supplier;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import steelyard.harness.local.RunIds;
import steelyard.harness.local.RunPlan;
import steelyard.harness.sweep.Builds;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.Instance;
import steelyard.harness.sweep.Setup;
import steelyard.harness.sweep.SingleChoice;
import steelyard.harness.sweep.text.Quantities;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Recipe;
import steelyard.results.ledger.RunKey;

/** One candidate on one instance, as given on the command line. */
final class CandidateOptions {
  @Parameters(index = "0", paramLabel = "FAMILY", description = "The family's name.")
  String family;

  @Parameters(
      index = "1",
      paramLabel = "INSTANCE",
      description = "The name of an instance that the family ships, or a file.")
  String instance;

  @Option(
      names = "--variant",
      paramLabel = "VARIANT",
      defaultValue = "plain",
      description =
          "plain, plain+AMENDMENT+AMENDMENT, or with a version: plain@ALIAS. Default: ${DEFAULT-VALUE}")
  String variant;

  @Option(
      names = "--backend",
      paramLabel = "NAME",
      defaultValue = "cpsat",
      description = "The backend. Default: ${DEFAULT-VALUE}")
  String backend;

  @Option(
      names = "--set",
      paramLabel = "KEY=VALUE",
      description = "An option of the backend; may be given several times.")
  Map<String, String> options = new TreeMap<>();

  @Option(
      names = "--seed",
      paramLabel = "N",
      defaultValue = "0",
      description = "0 leaves variables and constraints in order. Default: ${DEFAULT-VALUE}")
  long seed;

  @Option(
      names = "--threads",
      paramLabel = "N",
      defaultValue = "1",
      description = "Threads for the solver. Default: ${DEFAULT-VALUE}")
  int threads;

  @Option(
      names = "--wall",
      paramLabel = "TIME",
      defaultValue = "60s",
      description = "Wall limit on lowering, solving and answering. Default: ${DEFAULT-VALUE}")
  String wall;

  @Option(
      names = "--build",
      paramLabel = "TIME",
      defaultValue = "60s",
      description =
          "Limit on reading the instance and building its model. Default: ${DEFAULT-VALUE}")
  String build;

  @Option(
      names = "--work",
      paramLabel = "AMOUNT",
      description = "Work limit in a unit of the backend, such as '10000 conflicts'.")
  String work;

  @Option(
      names = "--memory",
      paramLabel = "SIZE",
      defaultValue = "2 GB",
      description = "Memory limit of all processes together. Default: ${DEFAULT-VALUE}")
  String memory;

  /** The run that the options describe. */
  RunPlan plan(Catalogue catalogue, Builds builds, Goal goal) {
    SingleChoice.Chosen chosen = SingleChoice.variant(catalogue, family, variant);
    Catalogue.Family known = chosen.family();
    Catalogue.Backend technology = SingleChoice.backend(catalogue, backend);
    Instance data = SingleChoice.instance(known, instance);
    Setup setup = SingleChoice.setup(technology, builds, options, threads, limits(technology));
    Recipe recipe =
        new Recipe(
            known.name(),
            known.alias(),
            known.code(),
            data.forRecipe(),
            chosen.variant().amendments(),
            chosen.variant().name());
    return new RunPlan(
        RunIds.next(),
        new RunKey(0, 0),
        0,
        Optional.empty(),
        recipe,
        setup,
        goal,
        seed,
        Optional.empty(),
        Duration.ofNanos((long) (quantity("--build", () -> Quantities.seconds(build)) * 1e9)),
        technology.heapShare());
  }

  private Limits limits(Catalogue.Backend technology) {
    double seconds = quantity("--wall", () -> Quantities.seconds(wall));
    long bytes = quantity("--memory", () -> Quantities.bytes(memory));
    Optional<Limits.Work> amount =
        Optional.ofNullable(work)
            .map(text -> quantity("--work", () -> Quantities.amount(text, technology.workUnits())))
            .map(measured -> new Limits.Work(measured.unit(), measured.amount().doubleValue()));
    return new Limits(seconds, amount, bytes);
  }

  private static <T> T quantity(String option, Supplier<T> reading) {
    try {
      return reading.get();
    } catch (IllegalArgumentException e) {
      throw new SweepProblem(List.of(option + ": " + e.getMessage()));
    }
  }
}
