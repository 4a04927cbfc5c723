package steelyard.harness.worker;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.locks.LockSupport;
import java.util.function.BooleanSupplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.harness.process.JavaCommand;

/** A worker and the solver program that it started. */
class RunProgramsTests {
  private static final long WITHIN_NANOS = TimeUnit.SECONDS.toNanos(30);

  @TempDir Path folder;

  /** Asks for a trial of a program, with a pipe to its standard input as the harness holds it. */
  private Process worker(Path script) throws IOException {
    return new ProcessBuilder(
            JavaCommand.java().toString(),
            "-XX:TieredStopAtLevel=1",
            "-cp",
            System.getProperty("java.class.path"),
            Worker.class.getName(),
            "probe",
            "program",
            "command=sh \"" + script + "\" {cnf}")
        .directory(folder.toFile())
        .redirectOutput(folder.resolve("out").toFile())
        .redirectError(folder.resolve("err").toFile())
        .start();
  }

  private Path script(String text) throws IOException {
    return Files.writeString(folder.resolve("solver.sh"), text);
  }

  private static boolean eventually(BooleanSupplier condition) {
    long from = System.nanoTime();
    while (!condition.getAsBoolean() && System.nanoTime() - from < WITHIN_NANOS) {
      LockSupport.parkNanos(5_000_000);
    }
    return condition.getAsBoolean();
  }

  private List<Event> events() throws IOException {
    return new EventTail(folder.resolve(Wire.EVENTS))
        .next().stream().map(StampedEvent::event).toList();
  }

  @Test
  void the_program_ends_withTheWorker_whenTheHarnessIsGone() throws Exception {
    Path pid = folder.resolve("pid");
    Process worker =
        worker(script("setsid sh -c 'echo $$ > pid.part; mv pid.part pid; exec sleep 1000'"));
    assertThat(eventually(() -> Files.exists(pid))).isTrue();
    long program = Long.parseLong(Files.readString(pid).strip());

    worker.getOutputStream().close();

    assertThat(worker.waitFor(30, TimeUnit.SECONDS)).isTrue();
    assertThat(eventually(() -> isGone(program))).isTrue();
  }

  /** A process that nobody has waited for yet is gone too. */
  private static boolean isGone(long pid) {
    try {
      return Files.readString(Path.of("/proc", Long.toString(pid), "stat")).contains(") Z ");
    } catch (IOException e) {
      return true;
    }
  }

  @Test
  void a_solver_that_is_no_solver_isRefusedInOneLine() throws Exception {
    Process worker = worker(script("echo hello; exit 3"));
    assertThat(worker.waitFor(30, TimeUnit.SECONDS)).isTrue();
    assertThat(events())
        .contains(
            new Event.Failure(
                Event.Failure.Kind.UNSUPPORTED,
                "the program does not answer a trial formula as the SAT competitions ask: sh: it"
                    + " printed no status line; exit code 3"));
    assertThat(folder.resolve("err")).isEmptyFile();
  }

  @Test
  void a_program_that_answers_isUsable_andToldWithItsVersion() throws Exception {
    Path script =
        script(
            """
            case $(tail -n 1 "$1") in
              "1 0") echo "s SATISFIABLE"; echo "v 1 0"; exit 10 ;;
              "-1 0") echo "s UNSATISFIABLE"; exit 20 ;;
            esac
            """);
    Process worker = worker(script);
    assertThat(worker.waitFor(30, TimeUnit.SECONDS)).isTrue();
    assertThat(events())
        .filteredOn(Event.Program.class::isInstance)
        .singleElement()
        .extracting(event -> Path.of(((Event.Program) event).file()).getFileName().toString())
        .isEqualTo("sh");
  }
}
