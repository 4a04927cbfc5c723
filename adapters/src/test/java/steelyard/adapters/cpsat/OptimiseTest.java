package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Objective.Sense;
import steelyard.variants.model.Relation;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Optima, and the bounds on the way to them, are exact integers. */
class OptimiseTest {
  private static final List<String> KINDS =
      List.of("linear", "clause", "all-different", "element", "table", "maximum", "bin-packing");

  @ParameterizedTest
  @EnumSource
  void findsTheOptimum_ofRandomModels(Sense sense) {
    for (int seed = 0; seed < 70; seed++) {
      RandomRelations made = new RandomRelations(seed, 4);
      Relation first = made.relation(KINDS.get(seed % KINDS.size()));
      List<Constraint> constraints = List.of(first, made.relation("linear"));
      UniformRandomProvider random = new SplitMix64(seed);
      long[] factors = LongStream.range(0, 4).map(i -> 1 + random.nextInt(9)).toArray();
      factors[seed % 4] *= -1;
      assertOptimum(
          made.domains(), constraints, objective(sense, random.nextInt(-50, 50), factors));
    }
  }

  /** Beyond 2^53 a double takes neighbours for equal, and the library's gap limits with it. */
  @ParameterizedTest
  @EnumSource
  void findsTheOptimum_whenDoublesCannotTellValuesApart(Sense sense) {
    List<Domain> domains =
        List.of(Domain.between(-2, 3), Domain.between(0, 5), Domain.between(-4, 4));
    LinearSum ties = new LinearSum(Ints.of(0, 1, 2), Longs.of(2, 3, 1), 0);
    for (long large : new long[] {1L << 53, 1L << 57, (1L << 59) + 1, (1L << 60) / 3}) {
      Constraint least = new Linear(ties, Comparison.GE, -1);
      Constraint most = new Linear(ties, Comparison.LE, 9);
      Objective objective = objective(sense, -(1L << 60) + 12_345, large, 1, -1);
      assertOptimum(domains, List.of(least, most), objective);
    }
  }

  /** 55 is the optimum of {@link JobShop#FT06}; beside 2^60 a double cannot tell it from 61. */
  @Test
  void provesTheOptimum_whenAFixedTermDwarfsTheRest() {
    Model model =
        JobShop.model(
            JobShop.FT06,
            (draft, makespan) -> {
              IntVar one = draft.integer("one", 1, 1);
              draft.minimize(one.times(1L << 60).plus(makespan));
            });
    Solved solved = Solving.solve(model, new Goal.Optimise());
    assertThat(solved.outcome().status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome().bound()).hasValue((1L << 60) + 55);
    assertThat(new Evaluator(model).judge(solved.heard().last()).objective())
        .hasValue((1L << 60) + 55);
  }

  @Test
  void saysOptimal_whenTheObjectiveIsConstant() {
    Objective seven = objective(Sense.MAXIMIZE, 7);
    Model model = Solving.flat(List.of(Domain.BOOLEAN), List.of(), Optional.of(seven));
    Solved solved = Solving.solve(model, new Goal.Optimise());
    assertThat(solved.outcome().status()).isEqualTo(Status.OPTIMAL);
    assertThat(solved.outcome().bound()).hasValue(7);
    assertThat(solved.heard().solutions).hasSize(1);
  }

  @Test
  void saysFeasible_whenThereIsNoObjective() {
    Model model = Solving.flat(List.of(Domain.BOOLEAN), List.of(), Optional.empty());
    Solved solved = Solving.solve(model, new Goal.Optimise());
    assertThat(solved.outcome().status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.outcome().ended()).isEqualTo(Why.EXHAUSTED);
    assertThat(solved.outcome().bound()).isEmpty();
  }

  @Test
  void ignoresTheObjective_whenAnySolutionWillDo() {
    Solved solved = Solving.solve(JobShop.model(JobShop.FT06), new Goal.Satisfy());
    assertThat(solved.outcome().status()).isEqualTo(Status.FEASIBLE);
    assertThat(solved.outcome().bound()).isEmpty();
    assertThat(solved.heard().solutions).hasSize(1);
    assertThat(solved.heard().bounds).isEmpty();
  }

  @Test
  void boundsTheOptimum_whenALimitEndsTheSearch() {
    Model least = JobShop.model(JobShop.FT10);
    Solved minimised = Solving.solve(least, new Goal.Optimise(), worked(100));
    assertThat(minimised.outcome().status()).isEqualTo(Status.FEASIBLE);
    assertThat(minimised.outcome().bound().getAsLong()).isBetween(655L, 930L);
    assertThat(minimised.heard().bounds).isSorted().last().isEqualTo(bound(minimised));
  }

  @Test
  void boundsFromAbove_whenMaximisingWithAConstant() {
    Model least = JobShop.model(JobShop.FT10);
    LinearSum makespan = least.objective().get().sum();
    LinearSum negated =
        new LinearSum(makespan.variables(), Longs.of(-1_000_003), 5_000_000_000_000_000_011L / 7);
    Model most = with(least, new Objective(Sense.MAXIMIZE, negated));
    long minimum = bound(Solving.solve(least, new Goal.Optimise(), worked(100)));
    long maximum = bound(Solving.solve(most, new Goal.Optimise(), worked(100)));
    assertThat(maximum).isEqualTo(negated.constant() - 1_000_003 * minimum);
  }

  private static SolveRequest worked(int conflicts) {
    return Solving.request(Map.of(), 1, Limit.work(WorkUnits.CONFLICTS, conflicts));
  }

  private static long bound(Solved solved) {
    return solved.outcome().bound().getAsLong();
  }

  private static Model with(Model model, Objective objective) {
    return Model.of(
        model.variables(),
        model.postings(),
        Optional.of(objective),
        model.branching(),
        model.hint());
  }

  private static void assertOptimum(
      List<Domain> domains, List<Constraint> constraints, Objective objective) {
    OptionalLong optimum = bruteForce(domains, constraints, objective);
    Model model = Solving.flat(domains, constraints, Optional.of(objective));
    Solved solved = Solving.solve(model, new Goal.Optimise());
    String which = constraints + " over " + domains + ", " + objective;
    assertThat(solved.outcome().ended()).as(which).isEqualTo(Why.EXHAUSTED);
    assertThat(solved.outcome().bound()).as(which).isEqualTo(optimum);
    assertThat(solved.outcome().status())
        .as(which)
        .isEqualTo(optimum.isPresent() ? Status.OPTIMAL : Status.INFEASIBLE);
    List<Long> found = new ArrayList<>();
    solved.heard().solutions.forEach(s -> found.add(objective.sum().value(s::get)));
    for (int i = 1; i < found.size(); i++) {
      assertThat(objective.sense().better(found.get(i), found.get(i - 1))).as(which).isTrue();
    }
    optimum.ifPresent(best -> assertThat(found).as(which).last().isEqualTo(best));
    optimum.ifPresent(
        best ->
            assertThat(solved.heard().bounds)
                .as(which)
                .noneMatch(bound -> objective.sense().better(best, bound)));
  }

  private static OptionalLong bruteForce(
      List<Domain> domains, List<Constraint> constraints, Objective objective) {
    LongStream values =
        AllAssignments.of(
                domains, v -> constraints.stream().allMatch(new RelationJudge(i -> v[i])::holds))
            .stream()
            .mapToLong(solution -> objective.sum().value(solution::get));
    return objective.sense() == Sense.MINIMIZE ? values.min() : values.max();
  }

  private static Objective objective(Sense sense, long constant, long... factors) {
    int[] variables = IntStream.range(0, factors.length).toArray();
    return new Objective(sense, new LinearSum(Ints.of(variables), Longs.of(factors), constant));
  }
}
