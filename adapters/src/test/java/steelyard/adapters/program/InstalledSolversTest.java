package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.LongStream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.Parameter;
import org.junit.jupiter.params.ParameterizedClass;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.adapters.puzzles.GolombRuler;
import steelyard.adapters.puzzles.Pigeonholes;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Probe;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.TestPrograms;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Two solvers that Debian packages, where they are installed, against the judge. */
@ParameterizedClass
@ValueSource(strings = {"cadical --seed={seed} {cnf}", "picosat -v -s {seed} {cnf}"})
class InstalledSolversTest {
  private static final Goal OPTIMISE = new Goal.Optimise();

  @Parameter String command;
  @TempDir Path folder;

  @BeforeEach
  void assumeInstalled() {
    String program = Template.of(command).program();
    assumeTrue(
        new TestPrograms(folder).find(program).isPresent(), () -> ProgramBackend.missing(program));
  }

  @Test
  void answers_the_trial_andTellsItsVersion() {
    Settings settings =
        Settings.of(Solved.BACKEND.describe(), Map.of(ProgramBackend.COMMAND, command));
    Probe probe = Solved.BACKEND.probe(settings, new TestPrograms(folder));
    assertThat(probe)
        .isInstanceOfSatisfying(
            Probe.Usable.class,
            usable -> {
              assertThat(usable.program()).isAbsolute();
              assertThat(usable.version()).matches("[ -~]+").isNotEqualTo("unknown");
            });
  }

  @Test
  void enumerates_exactly_the_solutions() {
    for (long seed = 0; seed < 27; seed++) {
      RandomRelations made = new RandomRelations(9_000 + seed, 3);
      List<Constraint> asserted = asserted(made, seed);
      List<Ints> expected = solutions(made.domains(), asserted);
      if (expected.size() <= 12) {
        Model model = SmallModels.of(made.domains(), asserted);
        Solved solved = Solved.by(command, model, Solved.all(model), folder);
        assertThat(solved.solutions)
            .as("%s over %s", asserted, made.domains())
            .containsExactlyInAnyOrderElementsOf(expected);
        assertThat(solved.outcome)
            .isEqualTo(
                SolveOutcome.of(
                    expected.isEmpty() ? Status.INFEASIBLE : Status.FEASIBLE,
                    OptionalLong.empty(),
                    Why.EXHAUSTED));
      }
    }
  }

  @Test
  void proves_the_optimum_ofSumsOverMixedModels() {
    for (long seed = 0; seed < 45; seed++) {
      RandomRelations made = new RandomRelations(7_000 + seed, 4);
      List<Constraint> asserted = asserted(made, seed);
      Objective.Sense sense = seed % 2 == 0 ? Objective.Sense.MINIMIZE : Objective.Sense.MAXIMIZE;
      LinearSum sum = new LinearSum(Ints.of(0, 2, 3), Longs.of(seed % 3 - 3, 3, 1), 4);
      Objective objective = new Objective(sense, sum);
      Model model = SmallModels.of(made.domains(), asserted, Optional.of(objective));
      Solved solved = Solved.by(command, model, OPTIMISE, folder);
      LongStream values =
          solutions(made.domains(), asserted).stream().mapToLong(s -> sum.value(s::get));
      OptionalLong best = sense == Objective.Sense.MINIMIZE ? values.min() : values.max();
      assertThat(solved.outcome)
          .as("seed %s", seed)
          .isEqualTo(
              SolveOutcome.of(
                  best.isPresent() ? Status.OPTIMAL : Status.INFEASIBLE, best, Why.EXHAUSTED));
    }
  }

  private static List<Constraint> asserted(RandomRelations made, long seed) {
    List<Constraint> asserted = new ArrayList<>();
    for (long kind : new long[] {seed, seed + 4}) {
      List<String> kinds = RandomRelations.KINDS;
      asserted.add(made.relation(kinds.get((int) (kind % kinds.size()))));
    }
    return asserted;
  }

  private static List<Ints> solutions(List<Domain> domains, List<Constraint> asserted) {
    return AllAssignments.of(
        domains, values -> asserted.stream().allMatch(new RelationJudge(v -> values[v])::holds));
  }

  @Test
  void takes_a_formula_without_variables_andOneWithAnEmptyClause() {
    Model one = SmallModels.of(List.of(Domain.of(3)), List.of());
    assertThat(Solved.by(command, one, Solved.all(one), folder).solutions)
        .containsExactly(Ints.of(3));
    Model none = SmallModels.of(List.of(Domain.BOOLEAN), List.of(new Clause(Atoms.of())));
    assertThat(Solved.by(command, none, OPTIMISE, folder).outcome.status())
        .isEqualTo(Status.INFEASIBLE);
  }

  @Test
  void gives_equal_counters_whenSolvedTwice() {
    Solved once = Solved.by(command, GolombRuler.of(6), OPTIMISE, folder);
    Solved again = Solved.by(command, GolombRuler.of(6), OPTIMISE, folder);
    assertThat(again.counters).isEqualTo(once.counters);
    assertThat(again.solutions).isEqualTo(once.solutions);
    assertThat(once.counters).containsKeys("calls", "failures", "decisions", "propagations");
  }

  @Test
  void gives_other_counters_whenTheSeedIsOther() {
    Solved plain = Solved.by(command, GolombRuler.of(6), OPTIMISE, folder);
    Seeding seeding = Seeding.of(GolombRuler.of(6), 5);
    SolveRequest request = Solved.request(command, 5, Solved.NO_LIMIT, folder);
    Solved seeded = Solved.by(request, seeding.model(), OPTIMISE);
    assertThat(seeded.outcome).isEqualTo(plain.outcome);
    assertThat(seeded.counters).isNotEqualTo(plain.counters);
  }

  @Test
  void stops_after_so_many_calls_andKeepsWhatItFound() {
    SolveRequest request = Solved.request(command, 0, Solved.calls(2), folder);
    Solved solved = Solved.by(request, GolombRuler.of(7), OPTIMISE);
    assertThat(solved.outcome.status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.outcome.ended()).isEqualTo(Why.WORK);
    assertThat(solved.counters).containsEntry("calls", 2L);
    assertThat(solved.outcome.bound().getAsLong()).isLessThanOrEqualTo(25);
  }

  /** A formula that no solver without counting refutes: pigeons in too few holes, by clauses. */
  @Test
  void is_ended_whenTheDeadlineSaysStop() {
    long[] looks = {0};
    SolveRequest request = Solved.request(command, 0, Solved.until(() -> looks[0]++ > 50), folder);
    Solved solved = Solved.by(request, Pigeonholes.byPairs(40, 39), new Goal.Satisfy());
    assertThat(solved.outcome)
        .isEqualTo(SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), Why.STOPPED));
    assertThat(solved.counters).containsEntry("calls", 1L);
  }

  @Test
  void enumerates_no_more_than_asked() {
    Model model = SmallModels.of(List.of(Domain.between(1, 9)), List.of());
    Goal four = new Goal.Enumerate(Ints.of(0), 4);
    Solved solved = Solved.by(command, model, four, folder);
    assertThat(solved.solutions).hasSize(4).doesNotHaveDuplicates();
    assertThat(solved.counters).containsEntry("calls", 4L);
  }
}
