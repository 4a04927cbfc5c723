package steelyard.adapters.cpsat;

import com.google.ortools.sat.SatParameters;
import com.google.ortools.sat.SatParameters.SearchBranching;
import com.google.protobuf.Descriptors.FieldDescriptor;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveRequest;

/** A request in the library's parameters. */
final class Parameters {
  /** What remains of the default seed, which is 1, for seed 0; the library takes 31 bits. */
  private static final long SEEDS = 1L << 31;

  private Parameters() {}

  /**
   * The parameters of every call that serves the request, limits left out.
   *
   * @param guided whether the message carries a search strategy
   */
  static SatParameters of(SolveRequest request, boolean guided) {
    SatParameters.Builder parameters = SatParameters.newBuilder();
    for (Setting setting : CpSatSettings.all()) {
      if (!setting.name().equals(CpSatSettings.BRANCHING)) {
        set(setting, request.settings(), parameters);
      }
    }
    return parameters
        .setSearchBranching(search(request.settings().text(CpSatSettings.BRANCHING), guided))
        .setRandomSeed((int) Math.floorMod(request.seed() + 1, SEEDS))
        .setNumWorkers(request.threads())
        .setCatchSigintSignal(false)
        .setLogToStdout(false)
        .setRelativeGapLimit(0)
        // The default of 1e-4 is measured in doubles: beyond 2^53 it takes 1 for 0.
        .setAbsoluteGapLimit(0)
        .build();
  }

  private static void set(Setting setting, Settings given, SatParameters.Builder parameters) {
    FieldDescriptor field = SatParameters.getDescriptor().findFieldByName(setting.name());
    Object value =
        switch (setting.kind()) {
          case SWITCH -> given.flag(setting.name());
          case REAL -> given.real(setting.name());
          case INTEGER ->
              field.getJavaType() == FieldDescriptor.JavaType.INT
                  ? (Object) Math.toIntExact(given.integer(setting.name()))
                  : (Object) given.integer(setting.name());
          case CHOICE, COMMAND ->
              throw new IllegalStateException(setting.name() + " is no parameter");
        };
    parameters.setField(field, value);
  }

  private static SearchBranching search(String branching, boolean guided) {
    return switch (branching) {
      case "auto" ->
          guided ? SearchBranching.PARTIAL_FIXED_SEARCH : SearchBranching.AUTOMATIC_SEARCH;
      case "partial" -> SearchBranching.PARTIAL_FIXED_SEARCH;
      case "fixed" -> SearchBranching.FIXED_SEARCH;
      case "ignore" -> SearchBranching.AUTOMATIC_SEARCH;
      case "portfolio" -> SearchBranching.PORTFOLIO_SEARCH;
      case "pseudo-cost" -> SearchBranching.PSEUDO_COST_SEARCH;
      case "lp" -> SearchBranching.LP_SEARCH;
      default -> throw new IllegalArgumentException("no branching is called '" + branching + "'");
    };
  }

  /** Whether the model's branching is handed on. */
  static boolean follows(Settings settings) {
    return switch (settings.text(CpSatSettings.BRANCHING)) {
      case "auto", "partial", "fixed" -> true;
      default -> false;
    };
  }
}
