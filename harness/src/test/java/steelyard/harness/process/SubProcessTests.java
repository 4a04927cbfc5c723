package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.CompletableFuture;
import java.util.function.BooleanSupplier;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.harness.process.SubProcess.End;
import steelyard.harness.process.SubProcess.Ended;

/** Programs that a process starts within its own session. */
class SubProcessTests {
  private static final long MOST = 1 << 20;

  @TempDir Path temporary;
  private Trial trial;
  private final SubProcess programs = new SubProcess();

  @BeforeEach
  void makeFolder() {
    trial = new Trial(temporary);
  }

  private Ended shell(String script) throws IOException {
    return shell(script, () -> false);
  }

  private Ended shell(String script, BooleanSupplier stop) throws IOException {
    return programs.run(launch(script), stop, MOST);
  }

  private Launch launch(String script) {
    Path out = trial.folder.resolve("the output");
    Path err = trial.folder.resolve("the errors");
    return Launch.of("a call", trial.tag, List.of("sh", "-c", script), trial.folder)
        .writing(out, err);
  }

  private Path file(String name) {
    return trial.folder.resolve(name);
  }

  @Test
  void tells_code_andLastWords() throws IOException {
    Ended ended = shell("echo out; echo first >&2; echo last >&2; exit 10");
    assertThat(ended).isEqualTo(new Ended(End.ITSELF, 10, "first\nlast"));
    assertThat(file("the output")).hasContent("out\n");
  }

  @Test
  void tells_a_signal_asShellsDo() throws IOException {
    assertThat(shell("kill -SEGV $$").code()).isEqualTo(128 + 11);
  }

  @Test
  void runs_one_after_the_other_eachOnEmptiedFiles() throws IOException {
    shell("echo a long line of output");
    shell("echo short");
    assertThat(file("the output")).hasContent("short\n");
  }

  /** A JVM catches SIGPIPE; what it starts must die of it, as pipelines rely on. */
  @Test
  void lets_programs_die_ofABrokenPipe() throws IOException {
    Ended ended = shell("{ yes; echo $? >&2; } | head -n 1; kill -PIPE $$");
    assertThat(ended.code()).isEqualTo(128 + 13);
  }

  @Test
  void gives_nothing_to_read_thatWouldNotEnd() throws IOException {
    Path started = file("started");
    Ended ended = shell("touch started; cat", () -> Files.exists(started));
    assertThat(ended.end()).isEqualTo(End.STOPPED);
  }

  @Test
  void ends_all_that_came_of_it_whenToldToStop() throws IOException {
    String script =
        "trap '' TERM; (trap '' TERM HUP; setsid sh -c 'echo $$ > deep; exec sleep 1000') & wait";
    Path deep = file("deep");
    Ended ended = shell(script, () -> Files.exists(deep));
    assertThat(ended.end()).isEqualTo(End.STOPPED);
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void leaves_nothing_behind_whenAProgramEndsBeforeItsChildren() throws IOException {
    Ended ended = shell("setsid sleep 1000 & exit 20");
    assertThat(ended).isEqualTo(new Ended(End.ITSELF, 20, ""));
    assertThat(trial.survivors()).isEmpty();
  }

  @Test
  void ends_what_writes_too_much() throws IOException {
    Ended ended = shell("while true; do head -c 100000 /dev/zero; done");
    assertThat(ended.end()).isEqualTo(End.WROTE_TOO_MUCH);
    assertThat(shell("head -c 2000000 /dev/zero").end()).isEqualTo(End.WROTE_TOO_MUCH);
    assertThat(shell("head -c 1048576 /dev/zero").end()).isEqualTo(End.ITSELF);
  }

  @Test
  void ends_what_another_thread_waits_for() throws IOException {
    CompletableFuture<Ended> waiting =
        CompletableFuture.supplyAsync(
            () -> {
              try {
                return shell("touch started; sleep 1000");
              } catch (IOException e) {
                throw new IllegalStateException(e);
              }
            });
    assertThat(Eventually.holds(() -> Files.exists(file("started")))).isTrue();
    programs.endAll();
    assertThat(waiting.join().code()).isEqualTo(128 + 9);
    assertThat(trial.survivors()).isEmpty();
    assertThatThrownBy(() -> shell("true")).hasMessage("cannot start sh: all were ended");
  }

  @Test
  void says_in_a_line_whatCannotBeStarted() {
    Launch launch = Launch.of("call", trial.tag, List.of("no-such-program"), trial.folder);
    assertThatThrownBy(() -> programs.run(launch, () -> false, MOST))
        .isInstanceOf(IOException.class)
        .hasMessage("program 'no-such-program' not found or not executable");
    assertThat(SubProcess.find("no-such-program")).isEmpty();
    assertThat(SubProcess.find("sh")).isPresent();
  }
}
