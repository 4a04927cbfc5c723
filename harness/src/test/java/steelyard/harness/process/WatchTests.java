package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.Set;
import java.util.concurrent.CompletableFuture;
import java.util.stream.Stream;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.harness.process.Exit.Reason;

/** Real children that obey, and children that do not. */
class WatchTests {
  /** 128 + 9: SIGKILL is 9 in signal(7), Linux man-pages. */
  private static final int SIGKILL_CODE = 137;

  @TempDir Path temporary;
  private Trial trial;

  @BeforeEach
  void makeTrial() {
    trial = new Trial(temporary);
  }

  @AfterEach
  void leaveNothing() {
    trial.survivors().forEach(ProcessHandle::destroyForcibly);
  }

  /** With all tools of the system, and with none. */
  static Stream<Tools> tools() {
    return Stream.of(Tools.detect(), Tools.none());
  }

  @Test
  void reports_code_whenChildExits() throws IOException {
    Exit exit = trial.shell("echo trouble >&2; exit 3");

    assertThat(exit.code()).hasValue(3);
    assertThat(exit.reason()).isEmpty();
    assertThat(exit.killed()).isFalse();
    assertThat(exit.signal()).isEmpty();
    assertThat(exit.clean()).isFalse();
    assertThat(exit.stderr()).isEqualTo("trouble");
    assertThat(exit.wallNanos()).isPositive();
    assertThat(exit.overshootNanos()).isZero();
  }

  /** Signal numbers: signal(7), Linux man-pages: SIGTERM is 15. */
  @Test
  void reports_signal_whenChildDiesOfOne() throws IOException {
    Exit exit = trial.shell("kill -TERM $$");

    assertThat(exit.code()).hasValue(128 + 15);
    assertThat(exit.signal()).hasValue(15);
    assertThat(exit.reason()).isEmpty();
    assertThat(exit.killed()).isFalse();
  }

  @Test
  void hands_over_arguments_untouched_whenTheyHoldSpacesAndQuotes() throws IOException {
    Exit exit = trial.shell("pwd; printf '%s\\n' \"$@\"", "two words", "a'b\"c", "$HOME;*");

    assertThat(exit.clean()).isTrue();
    assertThat(trial.stdout().lines())
        .containsExactly(trial.folder.toString(), "two words", "a'b\"c", "$HOME;*");
  }

  @ParameterizedTest
  @MethodSource("tools")
  void kills_child_atLimitPlusGrace_whenItIgnoresEverySignalItCan(Tools tools) throws IOException {
    trial.tools = tools;
    trial.wall = Duration.ofMillis(200);
    trial.grace = Duration.ofMillis(150);
    Exit exit = trial.shell("trap '' TERM INT HUP; while :; do sleep 0.02; done");

    assertThat(exit.reason()).hasValue(Reason.WALL);
    assertThat(exit.killed()).isTrue();
    assertThat(exit.code()).hasValue(SIGKILL_CODE);
    assertThat(exit.left()).isZero();
    assertThat(exit.overshootNanos())
        .isGreaterThanOrEqualTo(trial.grace.toNanos())
        .isEqualTo(exit.mainNanos() - trial.wall.toNanos());
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void asks_first_andDoesNotKill_whenChildObeysAtTheLimit() throws IOException {
    trial.wall = Duration.ofMillis(100);
    Exit exit = trial.shell("read line; echo \"asked: $line\"; exit 7");

    assertThat(trial.stdout()).isEqualTo("asked: stop\n");
    assertThat(exit.code()).hasValue(7);
    assertThat(exit.reason()).hasValue(Reason.WALL);
    assertThat(exit.killed()).isFalse();
  }

  @Test
  void stops_child_whenSwitchIsThrown() throws IOException {
    RunningProcess child = trial.start("read line; exit 5");
    CompletableFuture<Exit> exit = CompletableFuture.supplyAsync(trial.watch(child)::await);
    trial.stop.stop();

    assertThat(exit.join().reason()).hasValue(Reason.STOPPED);
    assertThat(exit.join().killed()).isFalse();
    assertThat(exit.join().code()).hasValue(5);
  }

  @Test
  void kills_child_afterGrace_whenItDoesNotHearTheSwitch() throws IOException {
    trial.grace = Duration.ofMillis(150);
    trial.stop.stop();
    Exit exit = trial.shell("sleep 1000");

    assertThat(exit.reason()).hasValue(Reason.STOPPED);
    assertThat(exit.killed()).isTrue();
    assertThat(exit.wallNanos()).isGreaterThanOrEqualTo(trial.grace.toNanos());
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void kills_child_atOnce_whenSwitchSaysSo() throws IOException {
    trial.stop.kill();
    Exit exit = trial.shell("read line; exit 5");

    assertThat(exit.reason()).hasValue(Reason.STOPPED);
    assertThat(exit.killed()).isTrue();
  }

  @Test
  void kills_child_andKeepsInterrupt_whenItsThreadIsInterrupted() throws IOException {
    RunningProcess child = trial.start("sleep 1000");
    Thread.currentThread().interrupt();
    Exit exit = trial.watch(child).await();

    assertThat(Thread.interrupted()).isTrue();
    assertThat(exit.reason()).hasValue(Reason.STOPPED);
    assertThat(exit.code()).hasValue(SIGKILL_CODE);
    assertThat(trial.survivors()).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("tools")
  void ends_grandchild_whenItOutlivesTheChild(Tools tools) throws IOException {
    trial.tools = tools;
    Exit exit = trial.shell("sleep 1000 & exit 0");

    assertThat(exit.code()).hasValue(0);
    assertThat(exit.reason()).isEmpty();
    assertThat(exit.killed()).isFalse();
    assertThat(exit.strays()).isEqualTo(1);
    assertThat(exit.left()).isZero();
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void ends_daemon_whenItLeftTheSession() throws IOException {
    Exit exit =
        trial.shell(
            "setsid sh -c 'echo started > mark; sleep 1000' & while [ ! -f mark ]; do sleep 0.01; done");

    assertThat(exit.clean()).isTrue();
    assertThat(exit.strays()).isPositive();
    assertThat(trial.survivors()).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("tools")
  void ends_all_whenNewDaemonsAreMadeWithoutEnd(Tools tools) throws IOException {
    trial.tools = tools;
    trial.wall = Duration.ofMillis(200);
    trial.grace = Duration.ofMillis(10);
    Exit exit = trial.shell("while :; do setsid sleep 1000 & sleep 0.01; done");

    assertThat(exit.reason()).hasValue(Reason.WALL);
    assertThat(exit.left()).isZero();
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void kills_all_whenAChildOfTheChildTakesTooMuchMemory() throws IOException {
    trial.memoryBytes = 40 * Trial.MEBIBYTE;
    // tail keeps its input until the end, which does not come
    Exit exit = trial.shell("(head -c 100000000 /dev/zero; sleep 1000) | tail -c 100000000");

    assertThat(exit.reason()).hasValue(Reason.MEMORY);
    assertThat(exit.killed()).isTrue();
    assertThat(exit.usage().peakBytes()).isGreaterThan(trial.memoryBytes);
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void cuts_output_andLetsTheChildGoOn_whenItFloods() throws IOException {
    trial.outputBytes = Trial.MEBIBYTE;
    Exit exit =
        trial.shell(
            "head -c 20000000 /dev/zero;"
                + " while [ $(wc -c < stdout) -gt 1048576 ]; do sleep 0.01; done; echo end");

    assertThat(exit.clean()).isTrue();
    assertThat(trial.stdout().endsWith("end\n")).isTrue();
    assertThat(Files.size(trial.folder.resolve("stdout"))).isLessThan(2 * trial.outputBytes);
  }

  @Test
  void shortens_output_whenTheFloodIsNewAtTheEnd() throws IOException {
    trial.outputBytes = 1000;
    Exit exit = trial.shell("head -c 5000 /dev/zero; head -c 5000 /dev/zero >&2");

    assertThat(exit.clean()).isTrue();
    assertThat(Files.size(trial.folder.resolve("stdout"))).isLessThanOrEqualTo(1000);
    assertThat(Files.size(trial.folder.resolve("stderr"))).isLessThanOrEqualTo(1000);
  }

  @Test
  void kills_child_whenAPhaseOutlastsItsAllowance() throws IOException {
    trial.mainPhases = Set.of("lower", "solve");
    trial.allowances.put("load", Duration.ofMillis(80));
    trial.mark("load");
    Exit exit = trial.shell("sleep 1000");

    assertThat(exit.reason()).hasValue(Reason.PHASE);
    assertThat(exit.killed()).isTrue();
    assertThat(exit.phase()).isEqualTo("load");
    assertThat(exit.mainNanos()).isZero();
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void limits_main_phases_only_whenOthersTakeLonger() throws IOException {
    trial.mainPhases = Set.of("lower", "solve");
    trial.wall = Duration.ofMillis(50);
    trial.mark("load");
    Exit exit = trial.shell("sleep 0.4");

    assertThat(exit.clean()).isTrue();
    assertThat(exit.wallNanos()).isGreaterThan(trial.wall.toNanos());
    assertThat(exit.marks()).extracting(Exit.Mark::phase).containsExactly("load");
  }

  @Test
  void leaves_no_process_whenThePhaseSourceFails() throws IOException {
    trial.phases =
        () -> {
          throw new IllegalStateException("torn");
        };

    assertThatThrownBy(() -> trial.shell("sleep 1000")).hasMessage("torn");
    assertThat(trial.survivors()).isEmpty();
  }

  /**
   * Check values: the shell's own account, by {@code times} (POSIX.1-2017, XCU 2.14): user and
   * system time of the shell, then of its children that have ended.
   */
  @Test
  void counts_cpuTime_ofChildAndItsReapedChildren() throws IOException {
    String burn = "i=0; while [ $i -lt 150000 ]; do i=$((i+1)); done";
    RunningProcess child = trial.start("(" + burn + "); " + burn + "; times; read line");
    trial.phases =
        () -> {
          if (hasLines(2)) {
            trial.stop.stop();
          }
          return List.of();
        };
    Exit exit = trial.watch(child).await();
    double seconds = trial.stdout().lines().mapToDouble(WatchTests::secondsOfTimes).sum();

    assertThat(exit.killed()).isFalse();
    assertThat(seconds).isPositive();
    assertThat(exit.usage().cpuNanos() / 1e9).isCloseTo(seconds, within(0.05));
  }

  private boolean hasLines(int lines) {
    try {
      return trial.stdout().lines().count() >= lines;
    } catch (IOException e) {
      return false;
    }
  }

  /** A line such as {@code 0m0.52s 0m0.01s}. */
  private static double secondsOfTimes(String line) {
    return Stream.of(line.split(" ", -1))
        .map(time -> time.substring(time.indexOf('m') + 1, time.length() - 1))
        .mapToDouble(Double::parseDouble)
        .sum();
  }

  @Test
  void refuses_start_withOneSentence_whenProgramIsMissing() {
    Launch launch = Launch.of("trial", trial.tag, List.of("no-such-program"), trial.folder);

    assertThatThrownBy(() -> Launcher.unnoted(Tools.detect()).start(launch))
        .isInstanceOf(IOException.class)
        .hasMessage("program 'no-such-program' not found or not executable");
  }

  @Test
  void refuses_start_withOneSentence_whenFolderIsMissing() {
    Path nowhere = trial.folder.resolve("nowhere");
    Launch launch = Launch.of("trial", trial.tag, List.of("true"), nowhere);

    assertThatThrownBy(() -> Launcher.unnoted(Tools.detect()).start(launch))
        .isInstanceOf(IOException.class)
        .hasMessage("working folder " + nowhere + " does not exist");
  }

  @Test
  void gives_child_itsEnvironment_withoutWhatIsWithheld() throws IOException {
    Launch launch =
        Launch.of("trial", trial.tag, List.of("env"), trial.folder)
            .with("MOULD", "tile 7")
            .withhold(Set.of("PATH"));
    Exit exit = trial.watch(Launcher.unnoted(Tools.detect()).start(launch)).await();

    assertThat(exit.clean()).isTrue();
    assertThat(trial.stdout().lines())
        .contains("MOULD=tile 7", "STEELYARD_RUN=" + trial.tag)
        .noneMatch(line -> line.startsWith("PATH="));
  }

  @Test
  void pins_child_toItsCores() throws IOException {
    assumeTrue(Tools.detect().taskset().isPresent());
    int core = CpuTopology.here().allowed().get(0);
    Launch launch =
        Launch.of(
                "trial",
                trial.tag,
                List.of("grep", "Cpus_allowed_list", "/proc/self/status"),
                trial.folder)
            .on(List.of(core));
    trial.watch(Launcher.unnoted(Tools.detect()).start(launch)).await();

    assertThat(trial.stdout().strip()).isEqualTo("Cpus_allowed_list:\t" + core);
  }
}
