package steelyard.harness.local;

import java.time.Duration;
import java.util.Collections;
import java.util.Objects;
import java.util.Optional;
import java.util.TreeSet;
import steelyard.harness.sweep.Setup;
import steelyard.results.ledger.Conditions;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Goal;
import steelyard.results.ledger.Place;
import steelyard.results.ledger.Recipe;
import steelyard.results.ledger.RunKey;

/**
 * One run to be made.
 *
 * @param run its id, also the name of its folder
 * @param attempt how often this cell was started before
 * @param place where in a plan it belongs; empty for a run in the foreground
 * @param plainCanonical digest of plain on the same instance, if it is known
 * @param build what reading the instance and building its model may take
 * @param heapShare share of the memory limit for the Java heap
 */
public record RunPlan(
    String run,
    RunKey key,
    int attempt,
    Optional<Place> place,
    Recipe recipe,
    Setup setup,
    Goal goal,
    long seed,
    Optional<Digest> plainCanonical,
    Duration build,
    double heapShare) {
  public RunPlan {
    Objects.requireNonNull(run, "run");
    Objects.requireNonNull(key, "key");
    Objects.requireNonNull(place, "place");
    Objects.requireNonNull(recipe, "recipe");
    Objects.requireNonNull(setup, "setup");
    Objects.requireNonNull(goal, "goal");
    Objects.requireNonNull(plainCanonical, "plainCanonical");
    Objects.requireNonNull(build, "build");
  }

  /** Under what conditions it is made. */
  Conditions conditions() {
    return new Conditions(
        seed,
        setup.threads(),
        goal,
        setup.limits(),
        Collections.unmodifiableSortedSet(new TreeSet<>()),
        Conditions.Mode.COLD);
  }
}
