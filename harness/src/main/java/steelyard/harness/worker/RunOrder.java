package steelyard.harness.worker;

import java.util.Collections;
import java.util.Objects;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.spi.Work;

/**
 * One run as a worker is asked for it; lies as {@code order.json} in the run's folder.
 *
 * @param backend the adapter's name
 * @param settings options that differ from the defaults
 * @param goal what is asked of the solver; empty: optimise where there is an objective, else
 *     satisfy
 * @param enumerateAtMost for {@link GoalKind#ENUMERATE} how many solutions at most
 * @param wallSeconds the main clock's limit
 * @param work the work limit, if there is one
 */
public record RunOrder(
    Subject subject,
    String backend,
    SortedMap<String, String> settings,
    long seed,
    int threads,
    Optional<GoalKind> goal,
    long enumerateAtMost,
    double wallSeconds,
    Optional<Work> work) {

  /** The question. */
  public enum GoalKind {
    SATISFY,
    OPTIMISE,
    ENUMERATE
  }

  public RunOrder {
    Objects.requireNonNull(subject, "subject");
    Objects.requireNonNull(backend, "backend");
    settings = Collections.unmodifiableSortedMap(new TreeMap<>(settings));
    Objects.requireNonNull(goal, "goal");
    Objects.requireNonNull(work, "work");
  }
}
