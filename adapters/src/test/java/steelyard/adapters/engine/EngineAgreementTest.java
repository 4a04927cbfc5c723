package steelyard.adapters.engine;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SmallModels;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Task;
import steelyard.variants.model.View;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Every kind in every form against the judge, on every assignment of small domains. */
class EngineAgreementTest {
  private static final Map<String, String> BOUNDS = Map.of();
  private static final Map<String, String> DOMAIN =
      Map.of(EngineBackend.ALL_DIFFERENT, EngineBackend.DOMAIN);

  private static final int KINDS = RandomRelations.KINDS.size();

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenPosted(String kind) {
    for (int seed = 0; seed < 150; seed++) {
      RandomRelations made = new RandomRelations(seed, 4);
      Relation relation = made.relation(kind);
      assertEnumerates(made.domains(), List.of(relation), List.of(relation), seed);
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenConditional(String kind) {
    for (int seed = 0; seed < 50; seed++) {
      RandomRelations made = new RandomRelations(1_000 + seed, 3);
      Relation relation = made.relation(kind);
      for (Atom when : List.of(Atom.TRUE, Atom.FALSE, made.atom())) {
        for (Conditional.Mode mode : Conditional.Mode.values()) {
          Conditional conditional = new Conditional(when, mode, relation);
          assertEnumerates(made.domains(), List.of(conditional), List.of(relation), seed);
        }
      }
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenKindsMeet(String kind) {
    List<String> kinds = RandomRelations.KINDS;
    for (int seed = 0; seed < 60; seed++) {
      RandomRelations made = new RandomRelations(9_000 + seed, 4);
      Relation first = made.relation(kind);
      Relation second = made.relation(kinds.get(seed % kinds.size()));
      Conditional condition = new Conditional(made.atom(), Conditional.Mode.IF, second);
      List<Constraint> all = List.of(first, condition, made.relation("linear"));
      assertEnumerates(made.domains(), all, List.of(first, second), seed);
    }
  }

  private static void assertEnumerates(
      List<Domain> domains, List<Constraint> stated, List<Relation> relations, long seed) {
    List<Constraint> all = new ArrayList<>(stated);
    relations.stream().flatMap(EngineAgreementTest::durations).forEach(all::add);
    Model model = SmallModels.of(domains, all);
    Solved solved = Solved.of(model, Solved.all(model), seed % 2 == 0 ? BOUNDS : DOMAIN);
    List<Ints> expected = solutions(domains, all);
    assertThat(solved.outcome.ended()).isEqualTo(SolveOutcome.Why.EXHAUSTED);
    assertThat(solved.outcome.status())
        .isEqualTo(expected.isEmpty() ? Status.INFEASIBLE : Status.FEASIBLE);
    assertThat(solved.solutions)
        .as("seed %s: %s over %s", seed, all, domains)
        .hasSameSizeAs(expected);
    assertThat(Set.copyOf(solved.solutions))
        .as("seed %s: %s over %s", seed, all, domains)
        .isEqualTo(Set.copyOf(expected));
  }

  private static List<Ints> solutions(List<Domain> domains, List<? extends Constraint> all) {
    return AllAssignments.of(
        domains, values -> all.stream().allMatch(new RelationJudge(v -> values[v])::holds));
  }

  /** What a model says of every task beside the relation: start + duration = end. */
  private static Stream<Constraint> durations(Relation relation) {
    Stream<Task> tasks =
        relation instanceof NoOverlap disjoint
            ? disjoint.tasks().asList().stream()
            : relation instanceof Cumulative resource
                ? resource.tasks().asList().stream()
                : Stream.empty();
    return tasks.map(task -> zero(List.of(task.start(), task.duration(), task.end().negated())));
  }

  private static Linear zero(List<View> views) {
    int[] variables =
        views.stream().filter(v -> !v.isConstant()).mapToInt(View::variable).distinct().toArray();
    int[] kept = IntStream.of(variables).filter(x -> factor(views, x) != 0).toArray();
    long[] factors = IntStream.of(kept).mapToLong(x -> factor(views, x)).toArray();
    long constant = views.stream().mapToLong(View::offset).sum();
    LinearSum sum = new LinearSum(Ints.of(kept), Longs.of(factors), constant);
    return Linear.of(sum, Comparison.EQ, 0);
  }

  private static long factor(List<View> views, int variable) {
    return views.stream()
        .filter(v -> !v.isConstant() && v.variable() == variable)
        .mapToLong(View::sign)
        .sum();
  }

  @Test
  void provesTheOptimum_ofSumsOverMixedModels() {
    for (long seed = 0; seed < 300; seed++) {
      RandomRelations made = new RandomRelations(5_000 + seed, 4);
      List<Constraint> all = new ArrayList<>();
      for (long kind : new long[] {seed % KINDS, (seed + 4) % KINDS}) {
        Relation relation = made.relation(RandomRelations.KINDS.get((int) kind));
        all.add(relation);
        durations(relation).forEach(all::add);
      }
      Objective objective = objective(seed);
      Model model = SmallModels.of(made.domains(), all, Optional.of(objective));
      Map<String, String> settings =
          Map.of(EngineBackend.RESTARTS, EngineBackend.LUBY, EngineBackend.SCALE, "1");
      Solved solved = Solved.of(model, new Goal.Optimise(), seed % 2 == 0 ? Map.of() : settings);
      OptionalLong best = best(objective, solutions(made.domains(), all));
      assertThat(solved.outcome)
          .as("seed %s: %s, %s over %s", seed, objective, all, made.domains())
          .isEqualTo(
              SolveOutcome.of(
                  best.isPresent() ? Status.OPTIMAL : Status.INFEASIBLE,
                  best,
                  SolveOutcome.Why.EXHAUSTED));
      assertImproves(objective, solved, best);
    }
  }

  private static Objective objective(long seed) {
    UniformRandomProvider random = new SplitMix64(seed);
    int[] variables = {0, 2, 3};
    long[] factors = new long[variables.length];
    for (int i = 0; i < factors.length; i++) {
      factors[i] = random.nextLong(1, 5) * (random.nextBoolean() ? 1 : -1);
    }
    Objective.Sense sense =
        random.nextBoolean() ? Objective.Sense.MINIMIZE : Objective.Sense.MAXIMIZE;
    return new Objective(
        sense, new LinearSum(Ints.of(variables), Longs.of(factors), random.nextLong(-10, 11)));
  }

  private static OptionalLong best(Objective objective, List<Ints> solutions) {
    LongStream values = solutions.stream().mapToLong(s -> objective.sum().value(s::get));
    return objective.sense() == Objective.Sense.MINIMIZE ? values.min() : values.max();
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

  @Test
  void findsEachProjectionOnce() {
    for (int seed = 0; seed < 150; seed++) {
      RandomRelations made = new RandomRelations(20_000 + seed, 4);
      Relation relation =
          made.relation(RandomRelations.KINDS.get(seed % RandomRelations.KINDS.size()));
      List<Constraint> all = new ArrayList<>(List.of(relation));
      durations(relation).forEach(all::add);
      Model model = SmallModels.of(made.domains(), all);
      Ints projection = Ints.of(2, 0);
      Solved solved = Solved.of(model, new Goal.Enumerate(projection, Long.MAX_VALUE));
      Set<Ints> expected = new HashSet<>();
      solutions(made.domains(), all).forEach(s -> expected.add(Ints.of(s.get(2), s.get(0))));
      List<Ints> seen = solved.solutions.stream().map(s -> Ints.of(s.get(2), s.get(0))).toList();
      assertThat(seen).as("seed %s", seed).doesNotHaveDuplicates();
      assertThat(Set.copyOf(seen)).as("seed %s", seed).isEqualTo(expected);
    }
  }
}
