package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Set;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

class LaunchTests {
  private static final Path FOLDER = Path.of("/somewhere");

  @Test
  void refuses_names_andTagsThatWouldNotFitALine() {
    assertThatThrownBy(() -> Launch.of("two\nlines", "t", List.of("true"), FOLDER))
        .hasMessageContaining("one line");
    assertThatThrownBy(() -> Launch.of("run", "a/b", List.of("true"), FOLDER))
        .hasMessageContaining("'a/b'");
    assertThatThrownBy(() -> Launch.of("run", "t", List.of(), FOLDER))
        .hasMessage("the command of run run is empty");
  }

  @Test
  void refuses_limits_thatLimitNothing() {
    assertThatThrownBy(() -> ProcessLimits.plain(Duration.ZERO, 1))
        .hasMessage("wall limit PT0S is not positive");
    assertThatThrownBy(() -> ProcessLimits.plain(Duration.ofSeconds(1), 0))
        .hasMessageContaining("memory (0)");
  }

  @Test
  void refuses_phase_withTwoClocks() {
    Duration second = Duration.ofSeconds(1);
    TreeMap<String, Duration> allowances = new TreeMap<>();
    allowances.put("solve", second);

    assertThatThrownBy(
            () -> new ProcessLimits(second, Set.of("solve"), second, allowances, second, 1, 1))
        .hasMessageContaining("one clock");
  }

  @Test
  void says_what_is_inForce() {
    assertThat(Tools.none().inForce())
        .hasSize(3)
        .allSatisfy(line -> assertThat(line).contains(": no: "));
    assertThat(Tools.find("sh")).isPresent();
    assertThat(Tools.find("/no/such/program")).isEmpty();
  }

  @Test
  void calls_run_disturbed_onlyBeyondHalfASecond() {
    assertThat(usage(500_000_000).disturbed()).isFalse();
    assertThat(usage(500_000_001).disturbed()).isTrue();
  }

  private static Usage usage(long gapNanos) {
    return new Usage(0, 0, Usage.MemorySource.NONE, 0, gapNanos);
  }
}
