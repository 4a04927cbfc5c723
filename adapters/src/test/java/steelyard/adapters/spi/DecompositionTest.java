package steelyard.adapters.spi;

import static java.util.function.Function.identity;
import static java.util.stream.Collectors.counting;
import static java.util.stream.Collectors.groupingBy;
import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.BitSet;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.FieldSource;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Automaton;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Definition;
import steelyard.variants.model.DistinctValues;
import steelyard.variants.model.Division;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Modulo;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Product;
import steelyard.variants.model.Regular;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Table;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Variables;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.judge.FlatJudge;
import steelyard.variants.model.judge.RelationJudge;
import steelyard.variants.model.sample.RandomRelations;

/** Each truth and reduction against the judge, on every assignment of small domains. */
class DecompositionTest {
  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void truthHoldsExactlyWhereTheRelationDoes(String kind) {
    LongStream.range(0, 80)
        .forEach(
            seed -> {
              RandomRelations made = new RandomRelations(seed, 3);
              Relation relation = made.relation(kind);
              Fresh fresh = fresh(made.domains());
              Truth truth = Decomposition.of(relation, fresh);
              assertAgrees(made.domains(), fresh, relation, truth.definitions(), truth.holds());
              List<Constraint> both = new ArrayList<>(truth.holds());
              both.addAll(truth.implied());
              assertAgrees(made.domains(), fresh, relation, truth.definitions(), both);
            });
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void reductionHoldsExactlyWhereTheConditionalDoes(String kind) {
    LongStream.range(0, 30)
        .forEach(
            seed -> {
              RandomRelations made = new RandomRelations(1_000 + seed, 3);
              Relation relation = made.relation(kind);
              for (Atom when : List.of(Atom.TRUE, Atom.FALSE, made.atom(), made.atom())) {
                for (Conditional.Mode mode : Conditional.Mode.values()) {
                  assertReduces(made.domains(), new Conditional(when, mode, relation));
                }
              }
            });
  }

  @ParameterizedTest
  @FieldSource("steelyard.variants.model.sample.RandomRelations#KINDS")
  void definesInFiveShapesOnly(String kind) {
    for (long seed = 0; seed < 100; seed++) {
      RandomRelations made = new RandomRelations(seed, 4);
      Truth truth = Decomposition.of(made.relation(kind), fresh(made.domains()));
      assertThat(truth.definitions()).as("seed %s", seed).allMatch(DecompositionTest::isBase);
    }
  }

  @Test
  void needsNoDefinition_whereDomainsDecide() {
    Fresh fresh = fresh(List.of(Domain.between(0, 3), Domain.between(5, 9)));
    Truth truth = Decomposition.of(AllDifferent.of(View.of(0), View.of(1)), fresh);
    assertThat(truth.definitions()).isEmpty();
    assertThat(truth.holds()).isEmpty();
  }

  @Test
  void needsNoDefinition_whereOneVariableDecides() {
    Fresh fresh = fresh(List.of(Domain.between(0, 9)));
    NoOverlap pair = NoOverlap.of(Task.fixed(View.of(0), 3), Task.fixed(View.constant(4), 2));
    Truth truth = Decomposition.of(pair, fresh);
    assertThat(truth.definitions()).isEmpty();
    assertThat(truth.holds()).containsExactly(Clause.of(Atom.atMost(0, 1), Atom.atLeast(0, 6)));
  }

  @Test
  void saysNothingOfTheCapacity_whereNoTaskRuns() {
    Fresh fresh = fresh(List.of(Domain.BOOLEAN));
    Task absentUnless =
        new Task(View.constant(2), View.constant(3), View.constant(5), Atom.is(0, 1));
    Cumulative short0 =
        new Cumulative(Tasks.of(absentUnless), Views.ofConstants(0), View.constant(-1));
    assertThat(Decomposition.of(short0, fresh).holds())
        .containsExactly(Clause.of(Atom.isNot(0, 1)));
  }

  private static final View X = View.of(0);
  private static final View Y = View.of(1);
  private static final View Z = View.of(2);

  @Test
  void multipliesInBinary_whereFactorsHaveManyValues() {
    List<Domain> domains =
        List.of(Domain.between(-9, 12), Domain.between(-3, 17), Domain.of(-27, -1, 0, 60, 91));
    assertDecomposes(domains, new Product(X, Y, Z));
    assertDecomposes(domains, new Product(Y.negated().shifted(2), X.shifted(-4), Z));
    assertDecomposes(domains, new Product(X, X, Y.shifted(40)));
    assertDecomposes(domains, new Product(X, X.shifted(1), Z));
  }

  @Test
  void dividesTowardZero_whereDivisorsHaveManyValues() {
    List<Domain> domains =
        List.of(Domain.between(-20, 23), Domain.between(-9, 9), Domain.between(-3, 4));
    assertDecomposes(domains, new Division(X, Y, Z));
    assertDecomposes(domains, new Modulo(X, Y, Z));
    assertDecomposes(domains, new Modulo(X, X.shifted(3), Z));
    assertDecomposes(domains, new Modulo(X, View.constant(-7), Z.negated()));
    assertDecomposes(domains, new Division(View.constant(7), Y.negated(), Y.shifted(-1)));
  }

  @Test
  void joinsTheValuesThatAnAutomatonDoesNotKnow() {
    List<Domain> domains = List.of(Domain.between(-9, 9), Domain.of(4, 5), Domain.between(3, 12));
    Automaton automaton =
        Automaton.of(2, Ints.of(1), new int[] {0, 4, 1}, new int[] {0, 5, 0}, new int[] {1, 4, 0});
    assertDecomposes(domains, new Regular(Views.of(X, Y, Z, X), automaton));
    Automaton mute = Automaton.of(1, Ints.of(0));
    assertDecomposes(domains, new Regular(Views.of(X), mute));
    assertDecomposes(domains, new Regular(Views.of(), mute));
  }

  @Test
  void countsWhatIsNew_whereThereAreManyValues() {
    List<Domain> domains =
        List.of(Domain.between(0, 19), Domain.between(5, 25), Domain.between(0, 3));
    for (Comparison op : Comparison.values()) {
      assertDecomposes(domains, new DistinctValues(Views.of(X, Y, X), op, Z));
    }
  }

  private static void assertDecomposes(List<Domain> domains, Relation relation) {
    Fresh fresh = fresh(domains);
    Truth truth = Decomposition.of(relation, fresh);
    assertAgrees(domains, fresh, relation, truth.definitions(), truth.holds());
    assertReduces(domains, new Conditional(Atom.TRUE, Conditional.Mode.IF, relation));
  }

  private static void assertReduces(List<Domain> domains, Conditional constraint) {
    Fresh fresh = fresh(domains);
    Reduction reduction = Decomposition.of(constraint, fresh);
    assertAgrees(domains, fresh, constraint, reduction.definitions(), reduction.asserted());
  }

  /**
   * What is defined has exactly one value, as FlatJudge insists; what else is fresh has one value
   * where the constraint holds, and none elsewhere.
   */
  private static void assertAgrees(
      List<Domain> domains,
      Fresh fresh,
      Constraint constraint,
      List<Definition> definitions,
      List<? extends Constraint> asserted) {
    BitSet defined = new BitSet();
    definitions.forEach(definition -> defined.set(definition.variable()));
    List<Domain> all =
        IntStream.range(0, fresh.size())
            .mapToObj(v -> defined.get(v) ? Domain.of(0) : fresh.domain(v))
            .toList();
    Map<Ints, Long> completions =
        AllAssignments.of(
                all,
                values -> {
                  FlatJudge judge = new FlatJudge(values);
                  judge.complete(definitions, fresh::domain);
                  return asserted.stream().allMatch(judge.relations()::holds);
                })
            .stream()
            .map(values -> Ints.of(values.stream().limit(domains.size()).toArray()))
            .collect(groupingBy(identity(), counting()));
    List<Ints> wrong =
        AllAssignments.of(
            domains,
            values ->
                completions.getOrDefault(Ints.of(values), 0L)
                    != (new RelationJudge(v -> values[v]).holds(constraint) ? 1 : 0));
    assertThat(wrong)
        .as("%s over %s by %s, %s", constraint, domains, definitions, asserted)
        .isEmpty();
  }

  /** Whether the definition is of a stated shape; that it is total is seen where it is judged. */
  private static boolean isBase(Definition definition) {
    View own = View.of(definition.variable());
    if (definition.constraint() instanceof Element choice) {
      return choice.result().equals(own);
    }
    if (definition.constraint() instanceof Table function) {
      return function.polarity() == Table.Polarity.ALLOWED
          && function.scope().get(function.scope().size() - 1).equals(own);
    }
    if (definition.constraint() instanceof Division division) {
      return division.quotient().equals(own);
    }
    return definition.constraint() instanceof Conditional reified
        && reified.mode() == Conditional.Mode.IFF
        && reified.when().equals(own.atLeast(1))
        && (reified.then() instanceof Linear || reified.then() instanceof Clause);
  }

  private static Fresh fresh(List<Domain> domains) {
    List<Variables.Variable> variables = new ArrayList<>();
    IntStream.range(0, domains.size())
        .forEach(
            v ->
                variables.add(
                    new Variables.Variable("x" + v, domains.get(v), Variables.Kind.DECISION)));
    return Fresh.beside(Variables.of(variables));
  }
}
