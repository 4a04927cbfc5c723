package steelyard.adapters.program;

import java.util.Objects;

/** What came of one call of a program. */
sealed interface Answer {
  /** The formula has the model. */
  record Model(Assignment assignment) implements Answer {
    public Model {
      Objects.requireNonNull(assignment, "assignment");
    }
  }

  /** The formula has no model. */
  record NoModel() implements Answer {}

  /** The deadline said stop first. */
  record Stopped() implements Answer {}

  /** As many calls were made as the work limit allows. */
  record OutOfWork() implements Answer {}

  /**
   * There is no answer, or none that can be right.
   *
   * @param reason one line
   */
  record Nothing(String reason) implements Answer {
    public Nothing {
      Objects.requireNonNull(reason, "reason");
    }
  }
}
