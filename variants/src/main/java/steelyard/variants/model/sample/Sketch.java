package steelyard.variants.model.sample;

import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.ModelBuilder;

/**
 * A model before it is built: values that can be taken apart and put together again. Variable i is
 * decision i where there are so many, else definition i less their number; a definition mentions
 * earlier variables only.
 *
 * @param decisions a domain each
 * @param definitions each a term or a formula
 * @param postings what must hold
 * @param objective what is wanted, if anything
 */
public record Sketch(
    List<Domain> decisions,
    List<Defining> definitions,
    List<Formula> postings,
    Optional<Wanted> objective) {

  /** What a defined variable is: the value of a term or the truth of a formula. */
  public sealed interface Defining {
    /** The value of a term. */
    record ByTerm(Term term) implements Defining {}

    /** 1 where the formula holds, else 0. */
    record ByFormula(Formula formula) implements Defining {}
  }

  /** An objective. */
  public record Wanted(Objective.Sense sense, Term term) {
    public Wanted {
      Objects.requireNonNull(sense, "sense");
      Objects.requireNonNull(term, "term");
    }
  }

  public Sketch {
    decisions = List.copyOf(decisions);
    definitions = List.copyOf(definitions);
    postings = List.copyOf(postings);
    Objects.requireNonNull(objective, "objective");
  }

  /** The name of variable i, before and after building. */
  static String name(int variable) {
    return "x" + variable;
  }

  /** How many assignments its decisions have. */
  public long assignments() {
    return decisions.stream().mapToLong(Domain::size).reduce(1, Math::multiplyExact);
  }

  /** The same with the posting at {@code index} turned into its negation. */
  public Sketch negating(int index) {
    List<Formula> turned = new ArrayList<>(postings);
    turned.set(index, postings.get(index).not());
    return new Sketch(decisions, definitions, turned, objective);
  }

  /**
   * Builds the model.
   *
   * @throws steelyard.variants.model.build.ModelException if it is refused, as one that can
   *     overflow is
   */
  public Model model() {
    return ModelBuilder.of(this::write);
  }

  private void write(Draft draft) {
    List<IntVar> variables = new ArrayList<>();
    Renaming renaming = new Renaming(variables);
    for (Domain domain : decisions) {
      variables.add(draft.integer(name(variables.size()), domain));
    }
    for (Defining definition : definitions) {
      String name = name(variables.size());
      variables.add(
          definition instanceof Defining.ByTerm by
              ? draft.define(name, renaming.term(by.term()))
              : draft.define(name, renaming.formula(((Defining.ByFormula) definition).formula())));
    }
    postings.forEach(posting -> draft.group("all").post(renaming.formula(posting)));
    objective.ifPresent(
        wanted -> {
          Term term = renaming.term(wanted.term());
          if (wanted.sense() == Objective.Sense.MINIMIZE) {
            draft.minimize(term);
          } else {
            draft.maximize(term);
          }
        });
  }
}
