package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.google.ortools.sat.SatParameters;
import com.google.ortools.sat.SatParameters.SearchBranching;
import com.google.protobuf.Descriptors.FieldDescriptor;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveRequest;

/** The options against the library's own parameters. */
class SettingsTest {
  @ParameterizedTest
  @MethodSource("parameters")
  void haveTheLibrarysDefault(Setting setting) {
    Object byDefault = SatParameters.getDefaultInstance().getField(field(setting));
    assertThat(setting.defaultText()).isEqualTo(byDefault.toString());
  }

  @ParameterizedTest
  @MethodSource("parameters")
  void reachTheLibrary(Setting setting) {
    String changed =
        switch (setting.kind()) {
          case SWITCH -> setting.defaultText().equals("true") ? "false" : "true";
          case INTEGER -> setting.defaultText().equals("0") ? "1" : "0";
          case REAL, CHOICE, COMMAND -> "0.5";
        };
    SatParameters parameters = Parameters.of(request(Map.of(setting.name(), changed), 0, 1), false);
    assertThat(parameters.getField(field(setting)).toString()).isEqualTo(changed);
  }

  static Stream<Setting> parameters() {
    return CpSatSettings.all().stream().filter(s -> !s.name().equals(CpSatSettings.BRANCHING));
  }

  private static FieldDescriptor field(Setting setting) {
    return SatParameters.getDescriptor().findFieldByName(setting.name());
  }

  @ParameterizedTest
  @CsvSource({
    "auto, true, PARTIAL_FIXED_SEARCH",
    "auto, false, AUTOMATIC_SEARCH",
    "partial, false, PARTIAL_FIXED_SEARCH",
    "fixed, false, FIXED_SEARCH",
    "ignore, true, AUTOMATIC_SEARCH",
    "portfolio, true, PORTFOLIO_SEARCH",
    "pseudo-cost, true, PSEUDO_COST_SEARCH",
    "lp, true, LP_SEARCH"
  })
  void branchAsAsked(String word, boolean guided, SearchBranching search) {
    SatParameters parameters = Parameters.of(request(Map.of("branching", word), 0, 1), guided);
    assertThat(parameters.getSearchBranching()).isEqualTo(search);
  }

  @Test
  void keepTheLibraryQuietExactAndOnItsThreads() {
    SatParameters parameters = Parameters.of(request(Map.of(), 0, 3), false);
    assertThat(parameters.getNumWorkers()).isEqualTo(3);
    assertThat(parameters.getLogToStdout()).isFalse();
    assertThat(parameters.getCatchSigintSignal()).isFalse();
    assertThat(parameters.getAbsoluteGapLimit()).isZero();
    assertThat(parameters.getRelativeGapLimit()).isZero();
  }

  @Test
  void passTheSeedOn() {
    assertThat(seedOf(0)).isEqualTo(SatParameters.getDefaultInstance().getRandomSeed());
    assertThat(List.of(seedOf(1), seedOf(2), seedOf(-1L), seedOf(1L << 31)))
        .allMatch(seed -> seed >= 0)
        .contains(2, 3);
  }

  private static int seedOf(long seed) {
    return Parameters.of(request(Map.of(), seed, 1), false).getRandomSeed();
  }

  @Test
  void takeNoFreeText() {
    assertThatThrownBy(() -> request(Map.of("subsolvers", "lns"), 0, 1))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("subsolvers");
  }

  private static SolveRequest request(Map<String, String> given, long seed, int threads) {
    Settings settings = Settings.of(Solving.BACKEND.describe(), given);
    return new SolveRequest(settings, seed, threads, Limit.none());
  }
}
