package steelyard.variants.model;

import java.util.Objects;

/**
 * A piece of work in time. That {@code start + duration = end} is said where the task is made, for
 * absent tasks too; an absent task's start is otherwise free.
 *
 * @param duration at least 0 in every domain value
 * @param present {@link Atom#TRUE} where the task is not optional
 */
public record Task(View start, View duration, View end, Atom present) {

  public Task {
    Objects.requireNonNull(start, "start");
    Objects.requireNonNull(duration, "duration");
    Objects.requireNonNull(end, "end");
    Objects.requireNonNull(present, "present");
  }

  /** A task of constant duration that is always there. */
  public static Task fixed(Viewable start, int duration) {
    View from = start.view();
    return new Task(from, View.constant(duration), from.shifted(duration), Atom.TRUE);
  }
}
