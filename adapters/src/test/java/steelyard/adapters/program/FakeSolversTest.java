package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;

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
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Probe;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.TestPrograms;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;

/** What bad solvers print is never taken for an answer, and is told in a line. */
class FakeSolversTest {
  /** Two Booleans of which one must be true, and better the second: formula {@code 1 2 0}. */
  private static final Model MODEL =
      SmallModels.of(
          List.of(Domain.BOOLEAN, Domain.BOOLEAN),
          List.of(new Clause(Atoms.of(Atom.atLeast(0, 1), Atom.atLeast(1, 1)))),
          Optional.of(
              new Objective(Objective.Sense.MAXIMIZE, new LinearSum(Ints.of(1), Longs.of(1), 0))));

  @TempDir Path folder;

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "says-satisfiable-without-model | it printed 's SATISFIABLE' and no model",
        "says-unsatisfiable-and-exits-0 | it printed 's UNSATISFIABLE' but ended otherwise: exit"
            + " code 0",
        "exits-20-without-a-word | it printed no status line; exit code 20",
        "says-satisfiable-and-exits-20 | it printed 's SATISFIABLE' but ended otherwise: exit code"
            + " 20",
        "says-unsatisfiable-in-lower-case | its status line says 'unsatisfiable'",
        "says-unsatisfiable-without-s | it printed no status line; exit code 20",
        "says-unsatisfiable-in-the-name-of-a-file | it printed no status line; exit code 20",
        "says-both | it printed 2 status lines",
        "says-unsatisfiable-with-a-model | it printed 's UNSATISFIABLE' and a model",
        "makes-everything-false | its model does not satisfy clause 1",
        "says-both-of-a-variable | its model says both of variable 1",
        "names-a-variable-too-many | its model names variable 3 of 2",
        "breaks-off-its-model | its model breaks off: no 0 at the end",
        "goes-on-after-the-end | its model goes on after the 0",
        "prints-words-for-literals | its model has something that is no literal",
        "gives-half-a-model | its model does not satisfy clause 1",
        "prints-junk | it printed no status line; exit code 0",
        "gives-up | it gave up: 's UNKNOWN'; exit code 0",
        "lacks-a-library | it printed no status line; exit code 127: it, or a library of it, was"
            + " not found: error while loading shared libraries: libzz.so.1: cannot open shared"
            + " object file",
        "dies-of-a-broken-pipe | it printed 's SATISFIABLE' but ended otherwise: killed by signal"
            + " 13",
        "is-killed | it printed 's UNSATISFIABLE' but ended otherwise: killed by signal 9",
        "never-stops-printing | it was ended because it wrote too much",
      })
  void claims_nothing_andSaysWhy_whenTheSolver(String does, String reason) {
    Solved solved = Solved.by(FakeSolver.command(does), MODEL, new Goal.Optimise(), folder);
    assertThat(solved.outcome)
        .isEqualTo(
            new SolveOutcome(Status.UNKNOWN, OptionalLong.of(1), Why.FAILED, "sh: " + reason));
    assertThat(solved.solutions).isEmpty();
    assertThat(solved.bounds).containsExactly(1L);
  }

  @Test
  void keeps_what_was_found_whenTheSolverFailsLater() {
    String command = FakeSolver.command("is-right");
    Solved solved = Solved.by(command, MODEL, new Goal.Optimise(), folder);
    assertThat(solved.solutions).containsExactly(Ints.of(1, 0));
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.outcome.ended()).isEqualTo(Why.FAILED);
    assertThat(solved.outcome.reason()).isEqualTo("sh: its model does not satisfy clause 2");
  }

  /** A competition's rules let a model leave out what does not matter. */
  @Test
  void takes_a_right_answer_amongBannersAndWarnings() {
    String command = FakeSolver.command("is-right");
    Solved solved = Solved.by(command, MODEL, new Goal.Satisfy(), folder);
    assertThat(solved.outcome)
        .isEqualTo(SolveOutcome.of(Status.FEASIBLE, OptionalLong.empty(), Why.EXHAUSTED));
    assertThat(solved.solutions).containsExactly(Ints.of(1, 0));
    assertThat(solved.counters).isEqualTo(Map.of("calls", 1L, "failures", 3L, "decisions", 5L));
  }

  @Test
  void is_ended_whenTheDeadlineSaysStop_whateverItHasPrinted() {
    Path started = folder.resolve("child.pid");
    Solved solved =
        Solved.by(
            Solved.request(
                FakeSolver.command("never-ends"),
                0,
                Solved.until(() -> Files.exists(started)),
                folder),
            MODEL,
            new Goal.Optimise());
    assertThat(solved.outcome)
        .isEqualTo(SolveOutcome.of(Status.UNKNOWN, OptionalLong.of(1), Why.STOPPED));
  }

  @ParameterizedTest
  @ValueSource(strings = {"exits-20-without-a-word", "gives-up", "says-both", "prints-junk"})
  void is_refused_whenItIsTried(String does) {
    Probe probe = probe(FakeSolver.command(does));
    assertThat(((Refusal) probe).reason())
        .startsWith(
            "the program does not answer a trial formula as the SAT competitions ask: sh: it ");
  }

  /** One that answers the same to every formula. */
  @Test
  void is_refused_whenItFindsAModelOfAContradiction() {
    Refusal refusal = (Refusal) probe(FakeSolver.command("is-right"));
    assertThat(refusal.reason()).endsWith("sh: its model does not satisfy clause 2");
  }

  private Probe probe(String command) {
    Settings settings =
        Settings.of(Solved.BACKEND.describe(), Map.of(ProgramBackend.COMMAND, command));
    return Solved.BACKEND.probe(settings, new TestPrograms(folder));
  }
}
