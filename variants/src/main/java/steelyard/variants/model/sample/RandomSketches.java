package steelyard.variants.model.sample;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.function.Supplier;
import java.util.stream.IntStream;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Longs;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.build.ModelException;

/**
 * Random small models over every kind of relation, term and formula: nested and conditional
 * formulas, partial terms, definitions, objectives, holes and negative values in domains, constants
 * and repeated variables in scopes, coefficients near the largest that are allowed.
 */
public final class RandomSketches {
  private static final int MOST_ASSIGNMENTS = 400;
  private static final int DEEPEST = 3;
  private static final long LARGE = 1L << 50;

  private final SplittableRandom random;
  private final List<Domain> domains = new ArrayList<>();
  private final List<Sketch.Defining> definitions = new ArrayList<>();
  private int variables;

  private RandomSketches(SplittableRandom random) {
    this.random = random;
  }

  /** A sketch that can be built; equal seeds give equal sketches. */
  public static Sketch of(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    while (true) {
      Sketch sketch = new RandomSketches(random).sketch();
      if (sketch.assignments() <= MOST_ASSIGNMENTS && isAdmitted(sketch)) {
        return sketch;
      }
    }
  }

  /** Whether the model is taken: some of what is drawn could overflow or has no domain. */
  static boolean isAdmitted(Sketch sketch) {
    try {
      sketch.model();
      return TaskEnds.areSaid(sketch);
    } catch (ModelException | IllegalArgumentException | IndexOutOfBoundsException e) {
      return false;
    }
  }

  private Sketch sketch() {
    int decisions = 2 + random.nextInt(3);
    for (int i = 0; i < decisions; i++) {
      domains.add(RandomRelations.domain(random));
    }
    variables = decisions;
    List<Domain> own = List.copyOf(domains);
    int defined = random.nextInt(3);
    for (int i = 0; i < defined; i++) {
      define();
    }
    List<Formula> postings = some(1 + random.nextInt(3), () -> formula(DEEPEST));
    Optional<Sketch.Wanted> objective =
        random.nextBoolean() ? Optional.of(wanted()) : Optional.empty();
    return new Sketch(own, definitions, postings, objective);
  }

  private Sketch.Wanted wanted() {
    Objective.Sense sense = pick(List.of(Objective.Sense.values()));
    return new Sketch.Wanted(sense, sum(() -> variable(), 1));
  }

  /** A defined Boolean can stand in any scope; of another only terms are made. */
  private void define() {
    if (domains.size() == variables && random.nextBoolean()) {
      Formula formula = formula(1);
      // A task in it may have asked for definitions that come first.
      if (domains.size() == variables) {
        domains.add(Domain.BOOLEAN);
      }
      add(new Sketch.Defining.ByFormula(formula));
    } else {
      add(new Sketch.Defining.ByTerm(total(2)));
    }
  }

  /** The variable that is defined. */
  private int add(Sketch.Defining definition) {
    definitions.add(definition);
    return variables++;
  }

  private Relation relation() {
    Relation relation = relations().relation(pick(RandomRelations.KINDS));
    if (relation instanceof NoOverlap it) {
      return new NoOverlap(whole(it.tasks()));
    } else if (relation instanceof Cumulative it) {
      return new Cumulative(whole(it.tasks()), it.demands(), it.capacity());
    } else if (relation instanceof NoOverlap2D it) {
      return new NoOverlap2D(whole(it.across()), whole(it.up()));
    }
    return relation;
  }

  /** The tasks with ends that are the sums of their starts and durations. */
  private Tasks whole(Tasks tasks) {
    return Tasks.of(
        tasks.asList().stream()
            .map(t -> new Task(t.start(), t.duration(), end(t.start(), t.duration()), t.present()))
            .toList());
  }

  private View end(View start, View duration) {
    return TaskEnds.view(start, duration)
        .orElseGet(() -> View.of(add(TaskEnds.definition(start, duration))));
  }

  private Formula formula(int depth) {
    int kinds = depth == 0 ? 6 : 10;
    return switch (random.nextInt(kinds)) {
      case 0, 1, 2, 3 -> Formula.holds(relation());
      case 4 -> Formula.literal(relations().atom());
      case 5 -> new Formula.Compare(term(depth), comparison(), term(Math.max(0, depth - 1)));
      case 6 -> new Formula.All(some(random.nextInt(4), () -> formula(depth - 1)));
      case 7 -> new Formula.Any(some(random.nextInt(4), () -> formula(depth - 1)));
      case 8 -> formula(depth - 1).not();
      default -> formula(depth - 1).iff(formula(depth - 1));
    };
  }

  private RandomRelations relations() {
    return new RandomRelations(random, domains);
  }

  private Comparison comparison() {
    return pick(List.of(Comparison.values()));
  }

  private Term term(int depth) {
    if (depth > 0 && random.nextInt(4) == 0) {
      return partial(depth - 1);
    }
    return total(depth);
  }

  private Term partial(int depth) {
    return switch (random.nextInt(3)) {
      case 0 -> new Term.Quotient(term(depth), term(depth));
      case 1 -> new Term.Remainder(term(depth), term(depth));
      default -> new Term.Entry(some(1 + random.nextInt(3), () -> term(depth)), term(depth));
    };
  }

  private Term total(int depth) {
    if (depth == 0 || random.nextInt(3) == 0) {
      return leaf();
    }
    Supplier<Term> part = () -> total(depth - 1);
    return switch (random.nextInt(6)) {
      case 0 -> sum(part, random.nextInt(8) == 0 ? LARGE : 1);
      case 1 -> new Term.Largest(some(1 + random.nextInt(3), part));
      case 2 -> new Term.Smallest(some(1 + random.nextInt(3), part));
      case 3 -> new Term.Absolute(part.get());
      case 4 -> new Term.Product(part.get(), part.get());
      default -> new Term.Truth(formula(depth - 1));
    };
  }

  private Term sum(Supplier<Term> part, long unit) {
    List<Term> terms = some(random.nextInt(4), part);
    long[] coefficients = IntStream.range(0, terms.size()).mapToLong(i -> between(-3, 3)).toArray();
    for (int i = 0; i < coefficients.length; i++) {
      coefficients[i] *= unit;
    }
    return new Term.Sum(terms, Longs.of(coefficients));
  }

  private Term leaf() {
    return switch (random.nextInt(5)) {
      case 0 -> new Term.Constant(between(-4, 6));
      case 1 -> View.of(variable().id()).negated().shifted(between(-1, 3));
      default -> variable();
    };
  }

  private IntVar variable() {
    int id = random.nextInt(variables);
    return new IntVar(Sketch.name(id), id);
  }

  private <T> T pick(List<T> choices) {
    return choices.get(random.nextInt(choices.size()));
  }

  private int between(int low, int high) {
    return low + random.nextInt(high - low + 1);
  }

  private static <T> List<T> some(int size, Supplier<T> one) {
    List<T> list = new ArrayList<>();
    for (int i = 0; i < size; i++) {
      list.add(one.get());
    }
    return list;
  }
}
