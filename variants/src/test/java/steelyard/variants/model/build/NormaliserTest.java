package steelyard.variants.model.build;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.FlatJudge;

/** What adapters see says the same as what was written: on every assignment of small models. */
class NormaliserTest {
  private static final List<Domain> DOMAINS =
      List.of(Domain.between(-1, 2), Domain.of(-3, 0, 1), Domain.BOOLEAN);

  static IntStream seeds() {
    return IntStream.range(0, 400);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void keeps_the_meaning_of_a_random_formula(int seed) {
    Model model = ModelBuilder.of(draft -> write(draft, new SplittableRandom(seed)));
    Evaluator evaluator = new Evaluator(model);
    int[] decisions = new int[DOMAINS.size()];
    DOMAINS.get(0).stream()
        .forEach(
            x ->
                DOMAINS.get(1).stream()
                    .forEach(
                        y ->
                            DOMAINS.get(2).stream()
                                .forEach(
                                    b -> {
                                      decisions[0] = x;
                                      decisions[1] = y;
                                      decisions[2] = b;
                                      assertThat(flatHolds(model, decisions))
                                          .as("%s at %s %s %s", model.postings(), x, y, b)
                                          .isEqualTo(evaluator.judge(decisions).isValid());
                                    })));
  }

  private static void write(Draft draft, SplittableRandom random) {
    List<IntVar> variables = new ArrayList<>();
    for (int i = 0; i < DOMAINS.size(); i++) {
      variables.add(draft.integer("x" + i, DOMAINS.get(i)));
    }
    variables.add(draft.define("sum", Term.max(variables.get(0), variables.get(1).negated())));
    variables.add(draft.define("flag", formula(variables, random, 2)));
    draft.group("all").post(formula(variables, random, 3));
  }

  private static boolean flatHolds(Model model, int[] decisions) {
    int[] values = new int[model.variables().size()];
    System.arraycopy(decisions, 0, values, 0, decisions.length);
    FlatJudge judge = new FlatJudge(values);
    boolean holds = true;
    for (Posting posting : model.postings()) {
      judge.complete(posting.definitions(), model.variables()::domain);
      holds &= posting.asserted().stream().allMatch(judge.relations()::holds);
    }
    return holds;
  }

  private static Formula formula(List<IntVar> variables, SplittableRandom random, int depth) {
    if (depth == 0) {
      return comparison(variables, random, 1);
    }
    return switch (random.nextInt(8)) {
      case 0 -> Formula.all(formulas(variables, random, depth - 1));
      case 1, 2 -> Formula.any(formulas(variables, random, depth - 1));
      case 3 -> formula(variables, random, depth - 1).not();
      case 4 -> formula(variables, random, depth - 1).iff(formula(variables, random, depth - 1));
      case 5 -> Formula.holds(AllDifferent.of(view(variables, random), view(variables, random)));
      case 6 ->
          Formula.holds(
              Clause.of(view(variables, random).atLeast(1), view(variables, random).is(0)));
      default -> comparison(variables, random, depth);
    };
  }

  private static List<Formula> formulas(
      List<IntVar> variables, SplittableRandom random, int depth) {
    return IntStream.range(0, random.nextInt(4))
        .mapToObj(i -> formula(variables, random, depth))
        .toList();
  }

  private static Formula comparison(List<IntVar> variables, SplittableRandom random, int depth) {
    Comparison op = List.of(Comparison.values()).get(random.nextInt(4));
    return new Formula.Compare(term(variables, random, depth), op, term(variables, random, depth));
  }

  private static Term term(List<IntVar> variables, SplittableRandom random, int depth) {
    if (depth == 0) {
      return random.nextInt(4) == 0
          ? Term.constant(random.nextInt(-2, 3))
          : view(variables, random);
    }
    return switch (random.nextInt(11)) {
      case 0 -> Term.max(terms(variables, random, depth - 1));
      case 1 -> Term.min(terms(variables, random, depth - 1));
      case 2 -> Term.abs(term(variables, random, depth - 1));
      case 3 -> Term.at(terms(variables, random, depth - 1), term(variables, random, depth - 1));
      case 4 -> Term.truth(formula(variables, random, depth - 1));
      case 5 -> term(variables, random, depth - 1).times(term(variables, random, depth - 1));
      case 6 -> term(variables, random, depth - 1).dividedBy(term(variables, random, depth - 1));
      case 7 -> term(variables, random, depth - 1).remainder(term(variables, random, depth - 1));
      case 8 -> Term.count(terms(variables, random, depth - 1), 1, -1);
      default ->
          term(variables, random, depth - 1)
              .times(random.nextInt(-2, 3))
              .plus(term(variables, random, depth - 1));
    };
  }

  private static List<Term> terms(List<IntVar> variables, SplittableRandom random, int depth) {
    return IntStream.rangeClosed(0, random.nextInt(3))
        .mapToObj(i -> term(variables, random, depth))
        .toList();
  }

  private static View view(List<IntVar> variables, SplittableRandom random) {
    View view = variables.get(random.nextInt(variables.size())).view();
    return random.nextInt(3) == 0 ? view.negated().shifted(random.nextInt(-1, 2)) : view;
  }
}
