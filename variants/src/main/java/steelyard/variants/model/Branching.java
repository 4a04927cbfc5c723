package steelyard.variants.model;

import java.util.List;
import java.util.Objects;

/** An ordered list of phases: in each, which variable to decide next, and how. */
public record Branching(List<Phase> phases) {
  /** No wish: the backend's own search. */
  public static final Branching NONE = new Branching(List.of());

  /** Which undecided view comes next; ties go to the earlier in the list. */
  public enum VariableOrder {
    INPUT,
    SMALLEST_DOMAIN,
    LARGEST_DOMAIN,
    SMALLEST_MIN,
    LARGEST_MAX,
    WEIGHTED_DEGREE
  }

  /** Which part of the view's domain is tried first. */
  public enum ValueOrder {
    MIN,
    MAX,
    MEDIAN,
    LOWER_HALF,
    UPPER_HALF
  }

  /** Decide all of {@code views} in this way before the next phase. */
  public record Phase(Views views, VariableOrder by, ValueOrder pick) {
    public Phase {
      Objects.requireNonNull(views, "views");
      Objects.requireNonNull(by, "by");
      Objects.requireNonNull(pick, "pick");
    }

    Phase rewrite(Rewriting rewriting) {
      return new Phase(views.mapped(rewriting), by, pick);
    }
  }

  public Branching {
    phases = List.copyOf(phases);
  }

  public boolean isEmpty() {
    return phases.isEmpty();
  }

  Branching rewrite(Rewriting rewriting) {
    return new Branching(phases.stream().map(p -> p.rewrite(rewriting)).toList());
  }
}
