package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.TestPrograms;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Model;

/** What the contract asks of lowering to a program: refusals, limits, one solve. */
class ProgramBackendTest {
  private static final Model MODEL =
      SmallModels.of(List.of(Domain.between(0, 4), Domain.BOOLEAN), List.of());

  private static final String RIGHT = FakeSolver.command("is-right");

  @TempDir Path folder;

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "no-such-solver {cnf} | program 'no-such-solver' is not on the search path; install it, or"
            + " give its path in command",
        "/no/such/solver {cnf} | program '/no/such/solver' is not there or not executable",
        "sh --seed={seed} | command does not say where the formula's file goes: it lacks {cnf}",
        "sh {cnf} {sede} | command has the placeholder {sede}; known are {cnf}, {seed}, {seconds},"
            + " {threads}",
      })
  void refuses_in_one_line(String command, String reason) {
    SolveRequest request = Solved.request(command, 0, Solved.NO_LIMIT, folder);
    assertThat(Solved.lower(request, MODEL)).isEqualTo(new Refusal(reason));
    assertThat(Solved.BACKEND.probe(request.settings(), request.programs()))
        .isEqualTo(new Refusal(reason));
    assertThat(folder).isEmptyDirectory();
  }

  @Test
  void names_the_package_to_install() {
    assertThat(ProgramBackend.missing("picosat"))
        .isEqualTo(
            "program 'picosat' is not on the search path; install it, on Debian with: sudo apt-get"
                + " install picosat");
  }

  @Test
  void refuses_a_version_command_thatAsksForTheFormula() {
    Map<String, String> given = Map.of(ProgramBackend.VERSION_COMMAND, "{program} {cnf}");
    Settings settings = Settings.of(Solved.BACKEND.describe(), given);
    assertThat(Solved.BACKEND.probe(settings, new TestPrograms(folder)))
        .isEqualTo(new Refusal("version-command has the placeholder {cnf}; known is {program}"));
  }

  @Test
  void refuses_threads_thatTheCommandDoesNotPassOn() {
    SolveRequest one = Solved.request(RIGHT, 0, Solved.NO_LIMIT, folder);
    SolveRequest two = new SolveRequest(one.settings(), 0, 2, one.deadline(), one.programs());
    assertThat(Solved.lower(two, MODEL))
        .isEqualTo(
            new Refusal(
                "command does not say how many threads: it lacks {threads}, and the run has 2"));
    SolveRequest told = Solved.request(RIGHT + " -j{threads}", 0, Solved.NO_LIMIT, folder);
    SolveRequest both = new SolveRequest(told.settings(), 0, 2, told.deadline(), told.programs());
    assertThat(Solved.lower(both, MODEL)).isInstanceOf(Lowering.class);
  }

  @Test
  void refuses_more_clauses_thanAllowed() {
    SolveRequest request = Solved.request(RIGHT, 0, Solved.NO_LIMIT, folder);
    Settings settings =
        Settings.of(
            Solved.BACKEND.describe(), Map.of(ProgramBackend.COMMAND, RIGHT, "max-variables", "3"));
    Lowered lowered =
        Solved.lower(
            new SolveRequest(settings, 0, 1, request.deadline(), request.programs()), MODEL);
    assertThat(((Refusal) lowered).reason())
        .startsWith("program would need more than 3 variables (max-variables): 0 variables");
  }

  @Test
  void writes_nothing_andCallsNothing_whenStopWasAskedBefore() {
    Deadline stop = Solved.until(() -> true);
    Solved solved = Solved.by(Solved.request(RIGHT, 0, stop, folder), MODEL, new Goal.Satisfy());
    assertThat(solved.outcome)
        .isEqualTo(SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), Why.STOPPED));
    assertThat(solved.counters).isEmpty();
    assertThat(folder).isEmptyDirectory();
  }

  @Test
  void is_solved_once() {
    SolveRequest request = Solved.request(RIGHT, 0, Solved.NO_LIMIT, folder);
    try (Lowering lowering = (Lowering) Solved.lower(request, MODEL)) {
      lowering.solve(new Goal.Satisfy(), new Solved());
      assertThatThrownBy(() -> lowering.solve(new Goal.Satisfy(), new Solved()))
          .isInstanceOf(IllegalStateException.class);
    }
  }

  @Test
  void prints_what_the_program_reads() throws Exception {
    SolveRequest request = Solved.request(RIGHT, 0, Solved.NO_LIMIT, folder);
    try (Lowering lowering = (Lowering) Solved.lower(request, MODEL)) {
      Optional<Printable> printable = lowering.facet(Printable.class);
      StringBuilder text = new StringBuilder();
      printable.orElseThrow().print("dimacs", text);
      assertThat(text.toString().lines().filter(line -> !line.startsWith("c")))
          .containsExactlyElementsOf(
              Files.readAllLines(folder.resolve("formula.cnf")).stream()
                  .filter(line -> !line.startsWith("c"))
                  .toList());
    }
  }
}
