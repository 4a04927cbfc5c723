package steelyard.adapters.cpsat;

import com.google.ortools.sat.ConstraintProto;
import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.CpSolverResponse;
import com.google.ortools.sat.SatParameters;
import com.google.ortools.sat.SolutionCallback;
import com.google.ortools.sat.TableConstraintProto;
import java.util.LinkedHashSet;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.Ints;
import steelyard.variants.model.View;

/**
 * Every solution, each once as seen on the projection. The library enumerates solutions of all
 * variables; where too many of them look the same, it is stopped and started again with what was
 * found forbidden, so that variables outside of the projection cannot make the search endless.
 */
final class Enumeration implements LibraryCall.Listener {
  /** Repeats to bear in a round, beside one for each projected solution known. */
  private static final long PATIENCE = 1000;

  private final Instance instance;
  private final Goal.Enumerate goal;
  private final Monitor monitor;
  private final Deadline deadline;
  private final Decisions decisions;
  private final Limits limits;
  private final Set<Ints> found = new LinkedHashSet<>();
  private final Counters counters = new Counters(1);
  private LibraryCall call;
  private long repeats;
  private boolean cut;

  Enumeration(Instance instance, Deadline deadline, Goal.Enumerate goal, Monitor monitor) {
    this.instance = instance;
    this.goal = goal;
    this.monitor = monitor;
    this.deadline = deadline;
    this.decisions = new Decisions(instance);
    this.limits = new Limits(deadline);
  }

  SolveOutcome run() {
    Optional<Integer> unknown =
        goal.projection().stream().boxed().filter(v -> !instance.places().has(v)).findFirst();
    if (unknown.isPresent()) {
      String name = instance.model().variables().name(unknown.get());
      return ended(Why.REFUSED, "nothing says what the value of " + name + " is");
    }
    SolveOutcome outcome;
    do {
      outcome = deadline.stopAsked() ? unfinished("") : round();
    } while (cut && outcome.ended() == Why.EXHAUSTED && !complete());
    counters.tell(monitor);
    return outcome;
  }

  private boolean complete() {
    return found.size() >= goal.atMost() || (goal.projection().size() == 0 && !found.isEmpty());
  }

  private SolveOutcome round() {
    cut = false;
    repeats = 0;
    SatParameters.Builder parameters =
        instance.parameters().toBuilder()
            .setEnumerateAllSolutions(true)
            .setNumWorkers(1)
            .setInterleaveSearch(false)
            .setSymmetryLevel(0);
    limits.set(parameters);
    call = new LibraryCall(this);
    CpSolverResponse response = call.run(unseen(), parameters.build(), deadline);
    limits.spent(response);
    counters.add(response);
    return switch (response.getStatus()) {
      case OPTIMAL, INFEASIBLE -> ended(Why.EXHAUSTED, "");
      case MODEL_INVALID ->
          ended(Why.REFUSED, "CP-SAT refuses the model: " + response.getSolutionInfo());
      case FEASIBLE, UNKNOWN, UNRECOGNIZED ->
          cut ? ended(Why.EXHAUSTED, "") : unfinished(response.getSolutionInfo());
    };
  }

  /** The model without what was found. */
  private CpModelProto unseen() {
    if (found.isEmpty() || goal.projection().size() == 0) {
      return instance.message();
    }
    TableConstraintProto.Builder seen = TableConstraintProto.newBuilder().setNegated(true);
    goal.projection().stream()
        .forEach(v -> seen.addExprs(instance.places().expression(View.of(v))));
    found.forEach(row -> row.stream().forEach(seen::addValues));
    return instance.message().toBuilder()
        .addConstraints(ConstraintProto.newBuilder().setTable(seen))
        .build();
  }

  private SolveOutcome unfinished(String said) {
    return limits
        .ended()
        .map(why -> ended(why, ""))
        .orElseGet(() -> ended(Why.REFUSED, "CP-SAT gave up without a limit: " + said));
  }

  private SolveOutcome ended(Why why, String reason) {
    Status none = why == Why.EXHAUSTED ? Status.INFEASIBLE : Status.UNKNOWN;
    Status status = found.isEmpty() ? none : Status.FEASIBLE;
    return new SolveOutcome(status, OptionalLong.empty(), why, reason);
  }

  @Override
  public void solution(SolutionCallback at) {
    if (cut) {
      return;
    }
    if (found.add(seenOn(at))) {
      monitor.solution(decisions.at(at::solutionIntegerValue));
    } else {
      repeats++;
    }
    if (complete() || repeats > PATIENCE + found.size()) {
      cut = true;
      call.stop();
    }
  }

  private Ints seenOn(SolutionCallback at) {
    return Ints.of(
        goal.projection().stream()
            .map(v -> Math.toIntExact(at.solutionIntegerValue(instance.places().of(v))))
            .toArray());
  }

  @Override
  public void line(String line) {
    // The log, a line for each solution, is off.
  }
}
