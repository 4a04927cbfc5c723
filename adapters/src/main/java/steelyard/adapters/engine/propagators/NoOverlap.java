package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * Of any two tasks that are there, one ends no later than the other starts; a task of duration 0
 * may not lie strictly inside another.
 *
 * <p>Overload checking, detectable precedences, not-first/not-last and edge finding, both ways in
 * time ({@link UnaryRules}). Strength: weaker than bounds(Z), which is NP-hard. Cost: n log n per
 * rule. Optional tasks are found absent by overload and otherwise left alone. Not explained yet.
 * Forms: posted and conditional.
 */
public final class NoOverlap implements Decidable {
  private final TaskScope tasks;
  private final UnaryRules forward;
  private final UnaryRules backward;

  /** The tasks do not overlap. */
  public NoOverlap(TaskScope tasks) {
    this.tasks = tasks;
    forward = new UnaryRules(tasks);
    backward = new UnaryRules(tasks.mirrored());
  }

  @Override
  public int cost() {
    return QUADRATIC;
  }

  @Override
  public void attach(Wiring wiring) {
    tasks.attach(wiring);
  }

  @Override
  public boolean propagate(Store s) {
    return forward.overload(s)
        && forward.precedences(s)
        && backward.precedences(s)
        && forward.notLast(s)
        && backward.notLast(s)
        && forward.edges(s)
        && backward.edges(s);
  }

  /** FALSE if two tasks must overlap, TRUE if no two can. */
  @Override
  public Verdict verdict(Store s) {
    Verdict verdict = Verdict.TRUE;
    for (int i = 0; i < tasks.size(); i++) {
      for (int j = i + 1; j < tasks.size(); j++) {
        Verdict apart = apart(s, i, j);
        if (apart == Verdict.FALSE) {
          return apart;
        }
        verdict = apart == Verdict.OPEN ? apart : verdict;
      }
    }
    return verdict;
  }

  private Verdict apart(Store s, int i, int j) {
    if (tasks.presence(s, i) < 0 || tasks.presence(s, j) < 0) {
      return Verdict.TRUE;
    }
    if (tasks.latestEnd(s, i) <= tasks.earliestStart(s, j)
        || tasks.latestEnd(s, j) <= tasks.earliestStart(s, i)) {
      return Verdict.TRUE;
    }
    boolean there = tasks.presence(s, i) > 0 && tasks.presence(s, j) > 0;
    boolean cross =
        tasks.earliestEnd(s, i) > tasks.latestStart(s, j)
            && tasks.earliestEnd(s, j) > tasks.latestStart(s, i);
    return there && cross ? Verdict.FALSE : Verdict.OPEN;
  }
}
