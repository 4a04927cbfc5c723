package steelyard.adapters.cpsat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.adapters.cpsat.Solving.Solved;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.SolveOutcome.Why;
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
import steelyard.variants.model.Relation;
import steelyard.variants.model.Task;
import steelyard.variants.model.View;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Every kind in every form against the judge, on every assignment of small domains. */
class AgreementTest {
  private static final int SEEDS = Integer.getInteger("steelyard.agreement.seeds", 15);

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenPosted(String kind) {
    for (int seed = 0; seed < 3 * SEEDS; seed++) {
      RandomRelations made = new RandomRelations(seed, 3);
      Relation relation = made.relation(kind);
      assertAgrees(made.domains(), relation, relation, seed);
    }
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenConditional(String kind) {
    for (int seed = 0; seed < SEEDS; seed++) {
      RandomRelations made = new RandomRelations(5_000 + seed, 3);
      Relation relation = made.relation(kind);
      for (Atom when : List.of(Atom.TRUE, Atom.FALSE, made.atom(), made.atom())) {
        for (Conditional.Mode mode : Conditional.Mode.values()) {
          assertAgrees(made.domains(), new Conditional(when, mode, relation), relation, seed);
        }
      }
    }
  }

  /** Presolve joins constraints: three at a time, one of them often an equation. */
  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void findsExactlyTheSolutions_whenKindsMeet(String kind) {
    List<String> kinds = RandomRelations.KINDS;
    for (int seed = 0; seed < 3 * SEEDS; seed++) {
      RandomRelations made = new RandomRelations(9_000 + seed, 4);
      Relation first = made.relation(kind);
      Relation second = made.relation(seed % 2 == 0 ? "linear" : kinds.get(seed % kinds.size()));
      Relation third = made.relation("linear");
      List<Constraint> all =
          List.of(first, new Conditional(made.atom(), Conditional.Mode.IF, second), third);
      assertAgrees(made.domains(), all, List.of(first, second), seed);
    }
  }

  private static void assertAgrees(
      List<Domain> domains, Constraint constraint, Relation inner, long seed) {
    assertAgrees(domains, List.of(constraint), List.of(inner), seed);
  }

  private static void assertAgrees(
      List<Domain> domains, List<Constraint> stated, List<Relation> inner, long seed) {
    List<Constraint> all = new ArrayList<>();
    inner.stream().flatMap(AgreementTest::tasks).map(AgreementTest::duration).forEach(all::add);
    all.addAll(stated);
    List<Ints> expected =
        AllAssignments.of(
            domains, values -> all.stream().allMatch(new RelationJudge(v -> values[v])::holds));
    Model model = Solving.flat(domains, all, Optional.empty());
    int[] everything = IntStream.range(0, domains.size()).toArray();
    Solved solved =
        Solving.solve(
            model, new Goal.Enumerate(Ints.of(everything), Long.MAX_VALUE), Map.of(), Limit.none());
    assertThat(solved.outcome().ended())
        .as("%s %s %s: %s", seed, domains, all, solved.outcome())
        .isEqualTo(Why.EXHAUSTED);
    assertThat(solved.heard().solutions)
        .as("seed %s: %s over %s", seed, all, domains)
        .containsExactlyInAnyOrderElementsOf(expected);
  }

  private static Stream<Task> tasks(Relation relation) {
    if (relation instanceof NoOverlap disjoint) {
      return disjoint.tasks().asList().stream();
    }
    return relation instanceof Cumulative resource
        ? resource.tasks().asList().stream()
        : Stream.empty();
  }

  /** What the model says of every task: start + duration = end. */
  private static Linear duration(Task task) {
    return sumIsZero(List.of(task.start(), task.duration(), task.end().negated()));
  }

  private static Linear sumIsZero(List<View> views) {
    int[] variables =
        views.stream().filter(v -> !v.isConstant()).mapToInt(View::variable).distinct().toArray();
    long[] factors =
        IntStream.of(variables)
            .mapToLong(
                x ->
                    views.stream()
                        .filter(v -> !v.isConstant() && v.variable() == x)
                        .mapToInt(View::sign)
                        .sum())
            .toArray();
    int[] kept = IntStream.range(0, factors.length).filter(i -> factors[i] != 0).toArray();
    long constant = views.stream().mapToLong(View::offset).sum();
    LinearSum sum =
        new LinearSum(
            Ints.of(variables).permuted(kept), Longs.of(factors).permuted(kept), constant);
    return Linear.of(sum, Comparison.EQ, 0);
  }
}
