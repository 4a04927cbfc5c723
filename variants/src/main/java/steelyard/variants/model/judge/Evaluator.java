package steelyard.variants.model.judge;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Mentions;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;

/**
 * Judges solutions of one model from the values of its decision variables alone: completes the
 * defined variables by their definitions, then judges every source formula, then recomputes the
 * objective.
 */
public final class Evaluator {
  private final Model model;

  public Evaluator(Model model) {
    this.model = model;
  }

  /**
   * What was found.
   *
   * @param complete a value per variable by id; 0 for auxiliary ones
   * @param violations empty if and only if the assignment is a solution
   * @param objective exact; empty without an objective or with a value outside its domain
   */
  public record Judgement(Ints complete, List<Violation> violations, OptionalLong objective) {
    public Judgement {
      violations = List.copyOf(violations);
    }

    public boolean isValid() {
      return violations.isEmpty();
    }
  }

  /**
   * Something that the assignment breaks.
   *
   * @param posting empty if a value is outside its variable's domain
   * @param values of the named variables that the posting mentions
   */
  public record Violation(Optional<Posting> posting, SortedMap<String, Integer> values) {
    /** Which group, where in it, what it says and the values that break it. */
    public String describe() {
      return posting
          .map(p -> p.origin() + ": " + p.source() + " is broken by " + values)
          .orElseGet(() -> "outside the domain: " + values);
    }
  }

  /**
   * Judges one assignment.
   *
   * @param decisions values in the order of {@code model.variables().decisions()}
   * @throws IllegalArgumentException if there are more or fewer values than decisions
   */
  public Judgement judge(int[] decisions) {
    Variables variables = model.variables();
    int[] values = spread(decisions);
    List<Violation> violations = outsideDomain(values);
    if (!violations.isEmpty()) {
      return new Judgement(Ints.of(values), violations, OptionalLong.empty());
    }
    FormulaJudge judge = complete(values);
    for (Posting posting : model.postings()) {
      if (posting.duty() == Posting.Duty.ASSERTED && !judge.holds(posting.source())) {
        violations.add(new Violation(Optional.of(posting), mentioned(posting, variables, values)));
      }
    }
    OptionalLong objective = objective(values);
    return new Judgement(Ints.of(values), violations, objective);
  }

  /**
   * The objective of an assignment, exactly, whether or not it is a solution.
   *
   * @param decisions values in the order of {@code model.variables().decisions()}
   * @return empty without an objective or with a value outside its domain
   */
  public OptionalLong objectiveOf(int[] decisions) {
    int[] values = spread(decisions);
    if (model.objective().isEmpty() || !outsideDomain(values).isEmpty()) {
      return OptionalLong.empty();
    }
    complete(values);
    return objective(values);
  }

  private OptionalLong objective(int[] values) {
    return model
        .objective()
        .map(objective -> OptionalLong.of(objective.sum().value(v -> values[v])))
        .orElse(OptionalLong.empty());
  }

  /** Gives every defined variable its value. */
  private FormulaJudge complete(int[] values) {
    FormulaJudge judge = new FormulaJudge(v -> values[v]);
    for (Posting posting : model.postings()) {
      if (posting.duty() == Posting.Duty.DEFINITION) {
        complete(posting, judge, values);
      }
    }
    return judge;
  }

  /**
   * Whether one posting holds of completed values, withdrawn ones included.
   *
   * @param complete as {@link Judgement#complete()} gives it
   */
  public boolean holds(Posting posting, Ints complete) {
    return new FormulaJudge(complete::get).holds(posting.source());
  }

  private int[] spread(int[] decisions) {
    Ints ids = model.variables().decisions();
    if (decisions.length != ids.size()) {
      throw new IllegalArgumentException(
          decisions.length + " values for " + ids.size() + " decision variables");
    }
    int[] values = new int[model.variables().size()];
    for (int i = 0; i < decisions.length; i++) {
      values[ids.get(i)] = decisions[i];
    }
    return values;
  }

  private List<Violation> outsideDomain(int[] values) {
    List<Violation> violations = new ArrayList<>();
    Variables variables = model.variables();
    variables.decisions().stream()
        .filter(v -> !variables.domain(v).contains(values[v]))
        .forEach(
            v -> {
              SortedMap<String, Integer> value = new TreeMap<>();
              value.put(variables.name(v), values[v]);
              violations.add(new Violation(Optional.empty(), value));
            });
    return violations;
  }

  private static void complete(Posting posting, FormulaJudge judge, int[] values) {
    int defined = posting.defined();
    if (posting.source() instanceof Formula.Compare equation) {
      values[defined] = Math.toIntExact(judge.total(equation.right()));
    } else {
      values[defined] = judge.holds(((Formula.Iff) posting.source()).right()) ? 1 : 0;
    }
  }

  private static SortedMap<String, Integer> mentioned(
      Posting posting, Variables variables, int[] values) {
    SortedMap<String, Integer> named = new TreeMap<>();
    Mentions mentions =
        new Mentions(
            v -> {
              if (variables.get(v).kind() != Variables.Kind.AUXILIARY) {
                named.put(variables.name(v), values[v]);
              }
            });
    posting.definitions().forEach(d -> mentions.of(d.constraint()));
    for (Constraint constraint : posting.asserted()) {
      mentions.of(constraint);
    }
    return named;
  }
}
