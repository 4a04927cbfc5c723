package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A harness in a process of its own, ended in several ways while its children run. */
class HarnessDeathTests {
  /** 128 + 15: SIGTERM is 15 in signal(7), Linux man-pages. */
  private static final int SIGTERM_CODE = 143;

  @TempDir Path temporary;
  private Trial listener;
  private Trial deaf;
  private LiveTable live;
  private Process harness;

  private void startHarness(int graceSeconds) throws IOException {
    listener = new Trial(temporary);
    deaf = new Trial(temporary);
    Path table = temporary.resolve("live table");
    live = new LiveTable(table);
    harness =
        new ProcessBuilder(
                JavaCommand.java().toString(),
                "-XX:TieredStopAtLevel=1",
                "-cp",
                System.getProperty("java.class.path"),
                HarnessProgram.class.getName(),
                table.toString(),
                listener.folder.toString(),
                listener.tag,
                deaf.tag,
                Integer.toString(graceSeconds))
            .redirectErrorStream(true)
            .redirectOutput(temporary.resolve("log").toFile())
            .start();
    Path ready = listener.folder.resolve("ready");
    assertThat(Eventually.holds(() -> Files.exists(ready) || !harness.isAlive())).isTrue();
    assertThat(ready).exists();
  }

  @AfterEach
  void leaveNothing() throws IOException {
    harness.destroyForcibly();
    Eventually.holds(() -> !harness.isAlive());
    live.endSurvivors();
  }

  @Test
  void leaves_no_listener_andTheNextCommandEndsTheDeaf_whenHarnessIsKilled() throws IOException {
    startHarness(100);
    harness.destroyForcibly();

    assertThat(Eventually.holds(() -> listener.survivors().isEmpty())).isTrue();
    assertThat(deaf.survivors()).hasSize(1);
    assertThat(Eventually.holds(() -> !harness.isAlive())).isTrue();
    assertThat(live.endSurvivors()).containsExactly(new LiveTable.Survivor("deaf", 1, 0));
    assertThat(deaf.survivors()).isEmpty();
    assertThat(temporary.resolve("live table")).isEmptyDirectory();
  }

  @Test
  void keeps_children_whenTheirHarnessLives() throws IOException {
    startHarness(100);
    assertThat(live.endSurvivors()).isEmpty();
    assertThat(listener.survivors()).hasSize(1);
    assertThat(deaf.survivors()).hasSize(1);
  }

  @Test
  void stops_children_andReturnsInItsOwnTime_whenAskedOnce() throws IOException {
    startHarness(1);
    send("TERM");

    assertThat(Eventually.holds(() -> !harness.isAlive())).isTrue();
    assertThat(harness.exitValue()).isEqualTo(SIGTERM_CODE);
    assertThat(listener.folder.resolve("result")).content().matches("STOPPED \\w+ STOPPED \\w+");
    assertThat(listener.survivors()).isEmpty();
    assertThat(deaf.survivors()).isEmpty();
  }

  @Test
  void calls_runs_disturbed_whenTheHarnessWasSuspended() throws IOException {
    startHarness(1);
    send("STOP");
    long from = System.nanoTime();
    assertThat(Eventually.holds(() -> System.nanoTime() - from > 700_000_000)).isTrue();
    send("CONT");
    send("TERM");

    assertThat(Eventually.holds(() -> !harness.isAlive())).isTrue();
    assertThat(listener.folder.resolve("result")).hasContent("STOPPED disturbed STOPPED disturbed");
  }

  @Test
  void ends_all_atOnce_whenAskedAgain() throws IOException {
    startHarness(100);

    assertThat(Eventually.holds(() -> endedAfter("TERM"))).isTrue();
    assertThat(harness.exitValue()).isEqualTo(SIGTERM_CODE);
    assertThat(listener.folder.resolve("result")).doesNotExist();
    assertThat(listener.survivors()).isEmpty();
    assertThat(deaf.survivors()).isEmpty();
  }

  private boolean endedAfter(String signal) {
    send(signal);
    return !harness.isAlive();
  }

  private void send(String signal) {
    String pid = Long.toString(harness.pid());
    try {
      new ProcessBuilder("sh", "-c", "kill -" + signal + " $1", "sh", pid).start().waitFor();
    } catch (IOException | InterruptedException e) {
      throw new IllegalStateException(e);
    }
  }
}
