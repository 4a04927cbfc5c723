package steelyard.harness.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.harness.process.Eventually;
import steelyard.harness.process.JavaCommand;
import steelyard.results.ledger.Ledger;
import steelyard.results.ledger.Observation;
import steelyard.results.ledger.SweepSummary;

/** A sweep in a process of its own that somebody stops, and the same command again. */
class SweepStopTest {
  private static final Path CARTS =
      Path.of("src/test/resources/steelyard/harness/fixture/carts").toAbsolutePath();

  @TempDir Path folder;
  private Process sweep;

  @AfterEach
  void leaveNothing() {
    sweep.descendants().forEach(ProcessHandle::destroyForcibly);
    sweep.destroyForcibly();
  }

  /** Statuses are 128 and the signal's number in signal(7), Linux man-pages. */
  @ParameterizedTest
  @CsvSource({"INT, 130", "TERM, 143", "HUP, 129"})
  void a_stopped_sweep_leaves_no_process_andGoesOnWhereItStood(String signal, int status)
      throws IOException {
    Path file = folder.resolve("carts.yaml");
    Files.writeString(file, yaml());
    start(file);
    Path log = folder.resolve("log");
    assertThat(Eventually.holds(() -> ran(log) || !sweep.isAlive())).isTrue();
    List<ProcessHandle> workers = sweep.descendants().toList();
    assertThat(workers).as(Files.readString(log)).isNotEmpty();

    send(signal);
    assertThat(Eventually.holds(() -> !sweep.isAlive())).isTrue();
    assertThat(sweep.exitValue()).as(Files.readString(log)).isEqualTo(status);
    assertThat(workers).noneMatch(ProcessHandle::isAlive);
    SweepSummary stopped = summary();
    assertThat(stopped.runs()).isPositive().isLessThan(stopped.cells());

    StringWriter err = new StringWriter();
    int again =
        Steelyard.commandLine(new PrintWriter(new StringWriter()), new PrintWriter(err, true))
            .execute("sweep", file.toString(), "--ledger", ledger().toString());
    assertThat(again).as(err.toString()).isEqualTo(ExitStatus.OK);
    assertThat(err.toString())
        .contains(stopped.runs() + " of " + stopped.cells() + " runs were finished before");
    assertThat(summary().id()).isEqualTo(stopped.id());
    assertThat(summary().runs()).isEqualTo(stopped.cells());
    assertEachOnce();
  }

  private String yaml() {
    return """
        name: carts
        family: faulty-cart
        variants: [plain, plain+lightest-count]
        backends: [sat]
        instances: {folder: "%s", names: [even]}
        seeds: 4
        limits: {wall: 20 s, memory: 1 GB}
        """
        .formatted(CARTS);
  }

  private Path ledger() {
    return folder.resolve("ledger");
  }

  /** Signals that this process ignores, as background jobs do, would be ignored by its child. */
  private void start(Path file) throws IOException {
    sweep =
        new ProcessBuilder(
                "env",
                "--default-signal=INT,TERM,HUP",
                JavaCommand.java().toString(),
                "-XX:TieredStopAtLevel=1",
                "-cp",
                System.getProperty("java.class.path"),
                Steelyard.class.getName(),
                "sweep",
                file.toString(),
                "--ledger",
                ledger().toString())
            .redirectErrorStream(true)
            .redirectOutput(folder.resolve("log").toFile())
            .start();
  }

  /** Whether a run has finished and the next one has a process. */
  private boolean ran(Path log) {
    try {
      return Files.readString(log).contains("1/8  even") && sweep.descendants().count() > 1;
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  private SweepSummary summary() {
    try (Ledger ledger = Ledger.read(ledger().resolve("runs.db"))) {
      return ledger.plans().sweeps().get(0);
    }
  }

  private void assertEachOnce() {
    try (Ledger ledger = Ledger.read(ledger().resolve("runs.db"))) {
      List<Observation> seen = ledger.observations(ledger.plans().sweeps().get(0).id());
      assertThat(seen).hasSize(8).allMatch(Observation::proved);
      assertThat(seen).extracting(Observation::run).doesNotHaveDuplicates();
    }
  }

  private void send(String signal) {
    try {
      String pid = Long.toString(sweep.pid());
      new ProcessBuilder("sh", "-c", "kill -" + signal + " $1", "sh", pid).start().waitFor();
    } catch (IOException | InterruptedException e) {
      throw new IllegalStateException(e);
    }
  }
}
