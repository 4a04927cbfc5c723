package steelyard.adapters.sat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.LongStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Relation;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Solutions and optima of random small models against the judge, on every assignment. */
class SatAgreementTest {
  private static final Map<String, String> DIAGRAMS = Map.of();
  private static final Map<String, String> BINARY = Map.of(EncodingSettings.MOST_EDGES, "0");

  private static final int KINDS = RandomRelations.KINDS.size();

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void enumeratesExactlyTheSolutions_ofPostedRelations(String kind) {
    LongStream.range(0, 80)
        .forEach(
            seed -> {
              RandomRelations made = new RandomRelations(seed, 4);
              List<Relation> both = List.of(made.relation(kind), made.relation("linear"));
              assertEnumerates(made.domains(), both.subList(0, 1), DIAGRAMS);
              assertEnumerates(made.domains(), both, BINARY);
            });
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void enumeratesExactlyTheSolutions_ofConditionals(String kind) {
    LongStream.range(0, 25)
        .forEach(
            seed -> {
              RandomRelations made = new RandomRelations(1_000 + seed, 3);
              Relation relation = made.relation(kind);
              Map<String, String> settings = seed % 2 == 0 ? DIAGRAMS : BINARY;
              for (Atom when : List.of(Atom.TRUE, Atom.FALSE, made.atom())) {
                for (Conditional.Mode mode : Conditional.Mode.values()) {
                  Conditional conditional = new Conditional(when, mode, relation);
                  assertEnumerates(made.domains(), List.of(conditional), settings);
                }
              }
            });
  }

  @Test
  void provesTheOptimum_ofSumsOverMixedModels() {
    for (long seed = 0; seed < 300; seed++) {
      RandomRelations made = new RandomRelations(5_000 + seed, 4);
      List<Constraint> asserted = new ArrayList<>();
      for (long kind : new long[] {seed % KINDS, (seed + 4) % KINDS}) {
        asserted.add(made.relation(RandomRelations.KINDS.get((int) kind)));
      }
      Objective objective = objective(seed);
      Model model = SmallModels.of(made.domains(), asserted, Optional.of(objective));
      Solved solved = Solved.of(model, new Goal.Optimise(), seed % 2 == 0 ? DIAGRAMS : BINARY);
      OptionalLong best = best(objective, solutions(made.domains(), asserted));
      assertThat(solved.outcome)
          .as("seed %s: %s, %s over %s", seed, objective, asserted, made.domains())
          .isEqualTo(
              SolveOutcome.of(
                  best.isPresent() ? Status.OPTIMAL : Status.INFEASIBLE,
                  best,
                  SolveOutcome.Why.EXHAUSTED));
      assertImproves(objective, solved, best);
    }
  }

  private static void assertImproves(Objective objective, Solved solved, OptionalLong best) {
    OptionalLong last = OptionalLong.empty();
    for (Ints solution : solved.solutions) {
      long value = objective.sum().value(solution::get);
      assertThat(last.isEmpty() || objective.sense().better(value, last.getAsLong())).isTrue();
      last = OptionalLong.of(value);
    }
    assertThat(last).isEqualTo(best);
    for (long bound : solved.bounds) {
      assertThat(best.isPresent() && objective.sense().better(best.getAsLong(), bound)).isFalse();
    }
  }

  private static Objective objective(long seed) {
    UniformRandomProvider random = new SplitMix64(seed);
    int[] variables = {0, 2, 3};
    long[] coefficients = new long[variables.length];
    for (int i = 0; i < coefficients.length; i++) {
      coefficients[i] = random.nextLong(1, 5) * (random.nextBoolean() ? 1 : -1);
    }
    Objective.Sense sense =
        random.nextBoolean() ? Objective.Sense.MINIMIZE : Objective.Sense.MAXIMIZE;
    LinearSum sum =
        new LinearSum(Ints.of(variables), Longs.of(coefficients), random.nextLong(-10, 11));
    return new Objective(sense, sum);
  }

  private static OptionalLong best(Objective objective, List<Ints> solutions) {
    LongStream values = solutions.stream().mapToLong(s -> objective.sum().value(s::get));
    return objective.sense() == Objective.Sense.MINIMIZE ? values.min() : values.max();
  }

  private static void assertEnumerates(
      List<Domain> domains, List<? extends Constraint> asserted, Map<String, String> settings) {
    Model model = SmallModels.of(domains, asserted);
    Solved solved = Solved.of(model, Solved.all(model), settings);
    List<Ints> expected = solutions(domains, asserted);
    assertThat(solved.solutions)
        .as("%s over %s", asserted, domains)
        .containsExactlyInAnyOrderElementsOf(expected);
    assertThat(solved.outcome.status())
        .isEqualTo(expected.isEmpty() ? Status.INFEASIBLE : Status.FEASIBLE);
    assertThat(solved.outcome.ended()).isEqualTo(SolveOutcome.Why.EXHAUSTED);
  }

  private static List<Ints> solutions(List<Domain> domains, List<? extends Constraint> asserted) {
    return AllAssignments.of(
        domains, values -> asserted.stream().allMatch(new RelationJudge(v -> values[v])::holds));
  }
}
