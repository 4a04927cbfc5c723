package steelyard.adapters.sat;

import java.util.Optional;
import java.util.OptionalLong;
import steelyard.adapters.sat.SatSolver.Answer;
import steelyard.adapters.sat.encoding.Integers;
import steelyard.adapters.sat.encoding.ModelEncoder;
import steelyard.adapters.sat.encoding.ObjectiveBound;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Model;

/** Answers one goal by one solver call after another, each with more clauses. */
final class Search {
  /** Conflicts after which a large step is given up; common practice, not tuned. */
  private static final long STEP_BUDGET = 1_000;

  private final Model model;
  private final Integers integers;
  private final Optional<ObjectiveBound> objective;
  private final SatSolver solver;
  private final Deadline deadline;
  private final Monitor monitor;

  Search(Model model, ModelEncoder encoded, SatSolver solver, Deadline deadline, Monitor monitor) {
    this.model = model;
    this.integers = encoded.integers();
    this.objective = encoded.objective();
    this.solver = solver;
    this.deadline = deadline;
    this.monitor = monitor;
  }

  SolveOutcome run(Goal goal) {
    if (goal instanceof Goal.Enumerate all) {
      return enumerate(all.projection(), all.atMost());
    }
    return goal instanceof Goal.Optimise && objective.isPresent()
        ? optimise(objective.get())
        : satisfy();
  }

  private SolveOutcome satisfy() {
    Answer answer = search();
    if (answer == Answer.YES) {
      report();
    }
    return outcome(answer == Answer.YES, answer, OptionalLong.empty());
  }

  /**
   * Asks for something better until there is nothing. How much better doubles while it is found, so
   * that easy progress is not made in small steps. A step that is refuted proves a bound; from then
   * on the gap is halved. A step that takes too long is given up for the smallest.
   */
  private SolveOutcome optimise(ObjectiveBound bound) {
    long low = 0;
    monitor.bound(bound.value(low));
    Answer answer = search();
    if (answer != Answer.YES) {
      return outcome(false, answer, OptionalLong.of(bound.value(low)));
    }
    long high = improved(bound);
    long step = 1;
    boolean halves = false;
    while (low < high) {
      long target = bound.hasLiterals() ? Math.max(low, high - step) : high - 1;
      boolean isSmallest = target == high - 1;
      answer = isSmallest ? search() : solver.search(bound.atMost(target), STEP_BUDGET);
      switch (answer) {
        case YES -> high = improved(bound);
        case NO -> {
          low = target + 1;
          monitor.bound(bound.value(low));
          halves = true;
          if (!isSmallest) {
            bound.learnAtLeast(low);
          }
        }
        case OUT_OF_BUDGET -> halves = false;
        case STOPPED, OUT_OF_WORK -> {
          return outcome(true, answer, OptionalLong.of(bound.value(low)));
        }
      }
      long wider = answer == Answer.OUT_OF_BUDGET ? 1 : 2 * step;
      step = Math.max(1, Math.min(wider, halves ? (high - low) / 2 : high - low));
    }
    OptionalLong best = OptionalLong.of(bound.value(high));
    return SolveOutcome.of(Status.OPTIMAL, best, Why.EXHAUSTED);
  }

  /** Reports what was found and asks for better from now on; what it costs. */
  private long improved(ObjectiveBound bound) {
    report();
    long cost = bound.cost(model.objective().orElseThrow().sum().value(this::value));
    bound.requireAtMost(cost - 1);
    return cost;
  }

  private Answer search() {
    return solver.search(SatSolver.NO_ASSUMPTION, SatSolver.NO_BUDGET);
  }

  /** Forbids each projected solution before asking for the next. */
  private SolveOutcome enumerate(Ints projection, long atMost) {
    for (int i = 0; i < projection.size(); i++) {
      if (!integers.has(projection.get(i))) {
        String name = model.variables().name(projection.get(i));
        return new SolveOutcome(
            Status.UNKNOWN,
            OptionalLong.empty(),
            Why.REFUSED,
            "variable " + name + " is defined, but nothing uses it: sat does not lower it");
      }
    }
    long found = 0;
    Answer answer = Answer.YES;
    while (found < atMost && answer == Answer.YES) {
      answer = search();
      if (answer == Answer.YES) {
        found++;
        report();
        integers.forbid(projection, solver.truth());
      }
    }
    return outcome(found > 0, answer, OptionalLong.empty());
  }

  private int value(int variable) {
    return integers.value(variable, solver.truth());
  }

  private void report() {
    monitor.solution(model.variables().decisions().stream().map(this::value).toArray());
  }

  private SolveOutcome outcome(boolean found, Answer last, OptionalLong bound) {
    Status status =
        found ? Status.FEASIBLE : last == Answer.NO ? Status.INFEASIBLE : Status.UNKNOWN;
    Why why =
        switch (last) {
          case YES, NO -> Why.EXHAUSTED;
          case OUT_OF_BUDGET -> throw new IllegalStateException("a search without budget ran out");
          case OUT_OF_WORK -> Why.WORK;
          case STOPPED -> stopped(deadline);
        };
    boolean isBound = last != Answer.NO;
    return SolveOutcome.of(status, isBound ? bound : OptionalLong.empty(), why);
  }

  /** Why a run was stopped. */
  static Why stopped(Deadline deadline) {
    return deadline.nanosLeft() <= 0 ? Why.WALL : Why.STOPPED;
  }
}
