package steelyard.adapters.sat.encoding;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.IntSummaryStatistics;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.rng.UniformRandomProvider;
import org.apache.commons.rng.core.source64.SplitMix64;
import org.junit.jupiter.api.RepeatedTest;
import org.junit.jupiter.api.RepetitionInfo;
import steelyard.adapters.spi.AllAssignments;
import steelyard.adapters.spi.SmallModels;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.Model;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.judge.RelationJudge;

/**
 * Where the source of an encoding says that unit propagation finds every consequence, it does: on
 * all subsets of small domains it leaves exactly the values that have a support.
 */
class StrengthTest {
  private static final int SEEDS = 30;

  private final Clauses clauses = new Clauses();
  private ModelEncoder encoder;

  @RepeatedTest(SEEDS)
  void allowedTable_isDomainConsistent(RepetitionInfo run) {
    UniformRandomProvider random = new SplitMix64(run.getCurrentRepetition());
    List<int[]> rows = new ArrayList<>();
    for (int r = 1 + random.nextInt(6); r > 0; r--) {
      rows.add(IntStream.range(0, 3).map(c -> random.nextInt(4)).toArray());
    }
    Table table = new Table(Views.ofVariables(0, 1, 2), Tuples.of(3, rows), Table.Polarity.ALLOWED);
    List<Domain> domains = domains(random, 3);
    assertFindsAll(domains, table, subsets(domains));
  }

  @RepeatedTest(SEEDS)
  void elementOverConstants_isDomainConsistent(RepetitionInfo run) {
    UniformRandomProvider random = new SplitMix64(run.getCurrentRepetition());
    int[] array = IntStream.range(0, 1 + random.nextInt(4)).map(i -> random.nextInt(5)).toArray();
    Element element = new Element(Views.ofConstants(array), View.of(0), View.of(1));
    List<Domain> domains = domains(random, 2);
    assertFindsAll(domains, element, subsets(domains));
  }

  @RepeatedTest(SEEDS)
  void linearInequality_isDomainConsistent(RepetitionInfo run) {
    UniformRandomProvider random = new SplitMix64(run.getCurrentRepetition());
    List<Domain> domains = domains(random, 2 + random.nextInt(2));
    Linear linear = linear(random, domains.size());
    assertFindsAll(domains, linear, subsets(domains));
  }

  @RepeatedTest(SEEDS)
  void countOfBooleans_isDomainConsistent(RepetitionInfo run) {
    UniformRandomProvider random = new SplitMix64(run.getCurrentRepetition());
    int n = 2 + random.nextInt(5);
    List<Domain> domains = IntStream.range(0, n).mapToObj(v -> Domain.BOOLEAN).toList();
    long[] ones = random.longs(n, 1, 2).toArray();
    LinearSum sum = new LinearSum(Ints.of(IntStream.range(0, n).toArray()), Longs.of(ones), 0);
    Comparison op = List.of(Comparison.LE, Comparison.GE, Comparison.EQ).get(random.nextInt(3));
    assertFindsAll(domains, new Linear(sum, op, random.nextInt(n + 1)), subsets(domains));
  }

  @RepeatedTest(SEEDS)
  void maximum_isBoundsConsistent(RepetitionInfo run) {
    UniformRandomProvider random = new SplitMix64(run.getCurrentRepetition());
    List<Domain> domains = IntStream.range(0, 3).mapToObj(v -> interval(random)).toList();
    Maximum maximum = new Maximum(Views.ofVariables(0, 1), View.of(2));
    List<List<Domain>> boxes =
        subsets(domains).stream().filter(box -> isBox(box, domains)).toList();
    assertFindsBounds(domains, maximum, boxes);
  }

  private static Linear linear(UniformRandomProvider random, int variables) {
    long[] factors = new long[variables];
    for (int i = 0; i < factors.length; i++) {
      factors[i] = random.nextLong(1, 4) * (random.nextBoolean() ? 1 : -1);
    }
    Ints scope = Ints.of(IntStream.range(0, variables).toArray());
    Comparison op = random.nextBoolean() ? Comparison.LE : Comparison.GE;
    return new Linear(new LinearSum(scope, Longs.of(factors), 0), op, random.nextLong(-4, 9));
  }

  private static List<Domain> domains(UniformRandomProvider random, int variables) {
    return IntStream.range(0, variables)
        .mapToObj(v -> Domain.of(IntStream.range(0, 3).map(i -> random.nextInt(5))))
        .toList();
  }

  private static Domain interval(UniformRandomProvider random) {
    int min = random.nextInt(3);
    return Domain.between(min, min + random.nextInt(3));
  }

  /** Every way to take a part of each domain. */
  private static List<List<Domain>> subsets(List<Domain> domains) {
    List<Domain> masks = domains.stream().map(d -> Domain.between(1, (1 << d.size()) - 1)).toList();
    return AllAssignments.of(masks).stream()
        .map(
            mask ->
                IntStream.range(0, domains.size())
                    .mapToObj(v -> part(domains.get(v), mask.get(v)))
                    .toList())
        .toList();
  }

  private static Domain part(Domain domain, int mask) {
    int[] values = domain.stream().toArray();
    return Domain.of(
        IntStream.range(0, values.length).filter(p -> (mask >> p & 1) == 1).map(p -> values[p]));
  }

  private static boolean isBox(List<Domain> part, List<Domain> whole) {
    return IntStream.range(0, part.size())
        .allMatch(
            v ->
                part.get(v).size()
                    == whole.get(v).stream()
                        .filter(x -> x >= part.get(v).min() && x <= part.get(v).max())
                        .count());
  }

  private void assertFindsAll(List<Domain> domains, Relation relation, List<List<Domain>> parts) {
    encode(domains, relation);
    for (List<Domain> part : parts) {
      assertLeaves(supported(relation, part), relation, domains, part);
    }
  }

  private void assertFindsBounds(
      List<Domain> domains, Relation relation, List<List<Domain>> boxes) {
    encode(domains, relation);
    for (List<Domain> box : boxes) {
      List<int[]> hulls = new ArrayList<>();
      List<int[]> supported = supported(relation, box);
      for (int v = 0; v < supported.size(); v++) {
        IntSummaryStatistics ends = IntStream.of(supported.get(v)).summaryStatistics();
        hulls.add(
            box.get(v).stream().filter(x -> x >= ends.getMin() && x <= ends.getMax()).toArray());
      }
      assertLeaves(hulls, relation, domains, box);
    }
  }

  /** By variable the values that occur in a solution; empty if there is none. */
  private static List<int[]> supported(Relation relation, List<Domain> part) {
    List<Ints> solutions =
        AllAssignments.of(part, values -> new RelationJudge(v -> values[v]).holds(relation));
    return IntStream.range(0, solutions.isEmpty() ? 0 : part.size())
        .mapToObj(v -> solutions.stream().mapToInt(s -> s.get(v)).sorted().distinct().toArray())
        .toList();
  }

  private void assertLeaves(
      List<int[]> expected, Relation relation, List<Domain> domains, List<Domain> part) {
    List<int[]> left =
        propagate(domains, part)
            .map(
                truth ->
                    IntStream.range(0, part.size())
                        .mapToObj(
                            v -> part.get(v).stream().filter(x -> mayBe(truth, v, x)).toArray())
                        .toList())
            .orElse(List.of());
    assertThat(left)
        .as("%s over %s within %s", relation, domains, part)
        .usingElementComparator(Arrays::compare)
        .containsExactlyElementsOf(expected);
  }

  /** The relation, and an equality literal for each value, so that each is known to be gone. */
  private void encode(List<Domain> domains, Relation relation) {
    Model model = SmallModels.of(domains, List.of(relation));
    encoder = new ModelEncoder(model, 1_000, clauses, Limits.NONE);
    encoder.encode();
    for (int v = 0; v < domains.size(); v++) {
      int variable = v;
      domains.get(v).stream().forEach(x -> encoder.integers().is(variable, x));
    }
  }

  private Optional<int[]> propagate(List<Domain> domains, List<Domain> part) {
    int[] removed =
        IntStream.range(0, domains.size())
            .flatMap(
                v ->
                    domains.get(v).stream()
                        .filter(x -> !part.get(v).contains(x))
                        .map(x -> -encoder.integers().is(v, x)))
            .toArray();
    return clauses.propagate(encoder.cnf().variables(), removed);
  }

  private boolean mayBe(int[] truth, int variable, int value) {
    return Clauses.value(truth, encoder.integers().is(variable, value)) >= 0;
  }
}
