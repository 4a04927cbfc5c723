package steelyard.adapters.program;

import java.io.IOException;
import java.util.OptionalLong;
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

/** Answers one goal by one call after another, each on a formula with more clauses. */
final class Search {
  /** Into so many steps the gap is divided at first; common practice, not tuned. */
  private static final long FIRST_STEPS = 8;

  private final Model model;
  private final ModelEncoder encoded;
  private final Integers integers;
  private final CnfFile formula;
  private final Calls calls;
  private final Deadline deadline;
  private final Monitor monitor;

  /**
   * A search.
   *
   * @param encoded has written the model to {@code formula}, where it goes on writing
   */
  Search(
      Model model,
      ModelEncoder encoded,
      CnfFile formula,
      Calls calls,
      Deadline deadline,
      Monitor monitor) {
    this.model = model;
    this.encoded = encoded;
    this.integers = encoded.integers();
    this.formula = formula;
    this.calls = calls;
    this.deadline = deadline;
    this.monitor = monitor;
  }

  SolveOutcome run(Goal goal) throws IOException {
    if (goal instanceof Goal.Enumerate all) {
      return enumerate(all.projection(), all.atMost());
    }
    return goal instanceof Goal.Optimise && encoded.objective().isPresent()
        ? optimise(encoded.objective().get())
        : satisfy();
  }

  private SolveOutcome satisfy() {
    Answer answer = calls.ask(formula);
    boolean found = answer instanceof Answer.Model;
    if (answer instanceof Answer.Model it) {
      report(it);
    }
    return outcome(found, answer, OptionalLong.empty());
  }

  /**
   * Asks for something better until there is nothing, in large steps, because every call starts
   * from nothing. How much better doubles while it is found; after a step that is refuted, which
   * proves a bound, the gap is halved. So the number of calls grows with the logarithm of the gap,
   * and none asks for more than the optimum itself takes: a target that can be met is no harder
   * than the optimum, one that cannot is refuted with room to spare.
   */
  private SolveOutcome optimise(ObjectiveBound bound) throws IOException {
    long low = 0;
    monitor.bound(bound.value(low));
    Answer answer = calls.ask(formula);
    if (!(answer instanceof Answer.Model first)) {
      return outcome(false, answer, OptionalLong.of(bound.value(low)));
    }
    long high = improved(bound, first);
    long step = (high - low) / FIRST_STEPS + 1;
    boolean halves = false;
    while (low < high) {
      long target = bound.hasLiterals() ? Math.max(low, high - step) : high - 1;
      answer = askForAtMost(bound, target, high);
      if (answer instanceof Answer.Model better) {
        high = improved(bound, better);
      } else if (answer instanceof Answer.NoModel) {
        low = target + 1;
        halves = true;
        monitor.bound(bound.value(low));
        if (low < high) {
          bound.learnAtLeast(low);
        }
      } else {
        return outcome(true, answer, OptionalLong.of(bound.value(low)));
      }
      step = Math.max(1, Math.min(2 * step, halves ? (high - low) / 2 : high - low));
    }
    OptionalLong best = OptionalLong.of(bound.value(high));
    return SolveOutcome.of(Status.OPTIMAL, best, Why.EXHAUSTED);
  }

  /** The smallest step is asked for already; for a larger one a clause is added for this call. */
  private Answer askForAtMost(ObjectiveBound bound, long target, long high) throws IOException {
    if (target == high - 1) {
      return calls.ask(formula);
    }
    CnfFile.End end = formula.end();
    formula.clause(new int[] {bound.atMost(target)}, 1);
    Answer answer = calls.ask(formula);
    formula.cutBack(end);
    return answer;
  }

  /** Reports what was found and asks for better from now on; what it costs. */
  private long improved(ObjectiveBound bound, Answer.Model found) {
    boolean[] truth = report(found);
    long value = model.objective().orElseThrow().sum().value(v -> integers.value(v, truth));
    long cost = bound.cost(value);
    bound.requireAtMost(cost - 1);
    return cost;
  }

  /** Forbids each projected solution before asking for the next. */
  private SolveOutcome enumerate(Ints projection, long atMost) {
    for (int variable : projection.toArray()) {
      if (!integers.has(variable)) {
        String name = model.variables().name(variable);
        return new SolveOutcome(
            Status.UNKNOWN,
            OptionalLong.empty(),
            Why.REFUSED,
            "variable " + name + " is defined, but nothing uses it: program does not lower it");
      }
    }
    long found = 0;
    Answer answer = calls.ask(formula);
    while (answer instanceof Answer.Model next) {
      boolean[] truth = report(next);
      found++;
      if (found == atMost) {
        break;
      }
      integers.forbid(projection, truth);
      answer = calls.ask(formula);
    }
    return outcome(found > 0, answer, OptionalLong.empty());
  }

  /** Reports a solution; the truth of the formula's variables in it. */
  private boolean[] report(Answer.Model found) {
    boolean[] truth = found.assignment().completed();
    monitor.solution(
        model.variables().decisions().stream().map(v -> integers.value(v, truth)).toArray());
    return truth;
  }

  private SolveOutcome outcome(boolean found, Answer last, OptionalLong bound) {
    Status status = found ? Status.FEASIBLE : Status.UNKNOWN;
    if (last instanceof Answer.Model) {
      return SolveOutcome.of(status, bound, Why.EXHAUSTED);
    }
    if (last instanceof Answer.NoModel) {
      Status none = found ? status : Status.INFEASIBLE;
      return SolveOutcome.of(none, OptionalLong.empty(), Why.EXHAUSTED);
    }
    if (last instanceof Answer.Nothing nothing) {
      return new SolveOutcome(status, bound, Why.FAILED, nothing.reason());
    }
    return SolveOutcome.of(
        status, bound, last instanceof Answer.OutOfWork ? Why.WORK : stopped(deadline));
  }

  /** Why a run was stopped. */
  static Why stopped(Deadline deadline) {
    return deadline.nanosLeft() <= 0 ? Why.WALL : Why.STOPPED;
  }
}
