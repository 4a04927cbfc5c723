package steelyard.adapters.sat.encoding;

import java.util.List;
import java.util.function.BooleanSupplier;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;

/**
 * How models become clauses, and how many clauses at most: the settings that all backends over
 * clauses share.
 *
 * @param mostVariables more propositional variables are refused
 * @param mostClauses more clauses are refused
 * @param mostEdges a sum whose decision diagram would have more edges is encoded as a binary number
 */
public record EncodingSettings(long mostVariables, long mostClauses, long mostEdges) {
  public static final String MOST_VARIABLES = "max-variables";
  public static final String MOST_CLAUSES = "max-clauses";
  public static final String MOST_EDGES = "diagram-edges";

  /** The settings as a backend declares them. */
  public static List<Setting> declared() {
    return List.of(
        Setting.integer(
            MOST_VARIABLES, 10_000_000, 1, 1_000_000_000, "refuse more propositional variables"),
        Setting.integer(MOST_CLAUSES, 30_000_000, 1, 1_000_000_000_000L, "refuse more clauses"),
        Setting.integer(
            MOST_EDGES,
            20_000,
            0,
            1_000_000_000,
            "encode sums whose diagram would have more edges as binary numbers"));
  }

  public static EncodingSettings of(Settings settings) {
    return new EncodingSettings(
        settings.integer(MOST_VARIABLES),
        settings.integer(MOST_CLAUSES),
        settings.integer(MOST_EDGES));
  }

  /** When to give up encoding. */
  public Limits limits(BooleanSupplier stop) {
    return new Limits(mostVariables, mostClauses, stop);
  }

  /**
   * Why a formula was not written.
   *
   * @param backend whose formula
   * @param passed the limit that was passed
   * @param counted what was encoding
   */
  public Refusal tooLarge(String backend, EncodingStopped.Why passed, ModelEncoder counted) {
    boolean isVariables = passed == EncodingStopped.Why.VARIABLES;
    long most = isVariables ? mostVariables : mostClauses;
    String what = isVariables ? "variables" : "clauses";
    String setting = isVariables ? MOST_VARIABLES : MOST_CLAUSES;
    String limit = backend + " would need more than " + most + " " + what + " (" + setting + "): ";
    String reached = counted.cnf().variables() + " variables, " + counted.cnf().clauses();
    return new Refusal(limit + reached + " clauses up to " + counted.at());
  }
}
