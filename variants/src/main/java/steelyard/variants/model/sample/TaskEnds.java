package steelyard.variants.model.sample;

import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Longs;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;

/**
 * That start and duration of a task sum to its end is said where the task is made, and relations
 * rely on it: in a sketch an end is a view of one of the two, or a definition of just that.
 */
final class TaskEnds {
  private TaskEnds() {}

  /** The end as a view, where one of the two is constant. */
  static Optional<View> view(View start, View duration) {
    if (duration.isConstant()) {
      return Optional.of(start.shifted(duration.offset()));
    }
    return start.isConstant() ? Optional.of(duration.shifted(start.offset())) : Optional.empty();
  }

  /** What defines an end that is no view. */
  static Sketch.Defining definition(View start, View duration) {
    return new Sketch.Defining.ByTerm(new Term.Sum(List.of(start, duration), Longs.of(1, 1)));
  }

  /** Whether the sketch says so of every task in it. */
  static boolean areSaid(Sketch sketch) {
    Stream<Relation> defining =
        sketch.definitions().stream()
            .flatMap(
                d ->
                    d instanceof Sketch.Defining.ByTerm by
                        ? in(by.term())
                        : in(((Sketch.Defining.ByFormula) d).formula()));
    Stream<Relation> posted = sketch.postings().stream().flatMap(TaskEnds::in);
    return Stream.concat(defining, posted)
        .flatMap(TaskEnds::tasks)
        .allMatch(task -> isSaid(task, sketch));
  }

  private static boolean isSaid(Task task, Sketch sketch) {
    Optional<View> view = view(task.start(), task.duration());
    if (view.isPresent()) {
      return view.get().equals(task.end());
    }
    int definition = task.end().variable() - sketch.decisions().size();
    return task.end().equals(View.of(task.end().variable()))
        && definition >= 0
        && definition < sketch.definitions().size()
        && sketch.definitions().get(definition).equals(definition(task.start(), task.duration()));
  }

  static Stream<Task> tasks(Relation relation) {
    if (relation instanceof NoOverlap it) {
      return it.tasks().asList().stream();
    } else if (relation instanceof Cumulative it) {
      return it.tasks().asList().stream();
    } else if (relation instanceof NoOverlap2D it) {
      return Stream.of(it.across(), it.up()).map(Tasks::asList).flatMap(List::stream);
    }
    return Stream.empty();
  }

  private static Stream<Relation> in(Formula formula) {
    if (formula instanceof Formula.Holds it) {
      return Stream.of(it.relation());
    } else if (formula instanceof Formula.Compare it) {
      return Stream.concat(in(it.left()), in(it.right()));
    } else if (formula instanceof Formula.All it) {
      return it.parts().stream().flatMap(TaskEnds::in);
    } else if (formula instanceof Formula.Any it) {
      return it.parts().stream().flatMap(TaskEnds::in);
    } else if (formula instanceof Formula.Not it) {
      return in(it.part());
    } else if (formula instanceof Formula.Iff it) {
      return Stream.concat(in(it.left()), in(it.right()));
    }
    return Stream.empty();
  }

  private static Stream<Relation> in(Term term) {
    if (term instanceof Term.Truth it) {
      return in(it.formula());
    } else if (term instanceof Term.Sum it) {
      return it.terms().stream().flatMap(TaskEnds::in);
    } else if (term instanceof Term.Largest it) {
      return it.terms().stream().flatMap(TaskEnds::in);
    } else if (term instanceof Term.Smallest it) {
      return it.terms().stream().flatMap(TaskEnds::in);
    } else if (term instanceof Term.Absolute it) {
      return in(it.term());
    } else if (term instanceof Term.Entry it) {
      return Stream.concat(it.array().stream().flatMap(TaskEnds::in), in(it.index()));
    } else if (term instanceof Term.Product it) {
      return Stream.concat(in(it.left()), in(it.right()));
    } else if (term instanceof Term.Quotient it) {
      return Stream.concat(in(it.dividend()), in(it.divisor()));
    } else if (term instanceof Term.Remainder it) {
      return Stream.concat(in(it.dividend()), in(it.divisor()));
    }
    return Stream.empty();
  }
}
