package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpModelProto;
import com.google.ortools.sat.CpSolverResponse;
import com.google.ortools.sat.SatParameters;
import com.google.ortools.sat.SolutionCallback;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.function.IntToLongFunction;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.variants.model.LinearSum;

/** The search for any solution or for a best one: one call of the library. */
final class Search implements LibraryCall.Listener {
  /** Doubles hold every integer up to here. */
  private static final double EXACT = 0x1p53;

  private final Instance instance;
  private final SolveRequest request;
  private final Monitor monitor;
  private final Optional<InnerObjective> objective;
  private final Optional<Long> constant;
  private final Decisions decisions;
  private OptionalLong best = OptionalLong.empty();
  private OptionalLong bound = OptionalLong.empty();
  private boolean solved;
  private boolean keepsBounds;

  Search(Instance instance, SolveRequest request, Goal goal, Monitor monitor) {
    this.instance = instance;
    this.request = request;
    this.monitor = monitor;
    boolean optimise = goal instanceof Goal.Optimise;
    this.objective = optimise ? instance.objective() : Optional.empty();
    this.constant = optimise ? instance.constantObjective() : Optional.empty();
    this.decisions = new Decisions(instance);
  }

  SolveOutcome run() {
    Limits limits = new Limits(request.deadline());
    if (request.deadline().stopAsked()) {
      return unfinished(Status.UNKNOWN, limits, "");
    }
    SatParameters.Builder parameters = instance.parameters().toBuilder();
    parameters.setLogSearchProgress(true);
    limits.set(parameters);
    CpModelProto message = objective.map(instance::optimising).orElse(instance.message());
    CpSolverResponse response =
        new LibraryCall(this).run(message, parameters.build(), request.deadline());
    limits.spent(response);
    Counters counters = new Counters(request.threads());
    counters.add(response);
    SolveOutcome outcome = outcome(response, limits);
    counters.tell(monitor);
    return outcome;
  }

  private SolveOutcome outcome(CpSolverResponse response, Limits limits) {
    return switch (response.getStatus()) {
      case OPTIMAL -> {
        solution(response::getSolution);
        yield optimal(response);
      }
      case FEASIBLE -> {
        solution(response::getSolution);
        innerBound(response.getInnerObjectiveLowerBound());
        yield objective.isEmpty()
            ? SolveOutcome.of(Status.FEASIBLE, OptionalLong.empty(), Why.EXHAUSTED)
            : unfinished(Status.FEASIBLE, limits, response.getSolutionInfo());
      }
      case INFEASIBLE -> SolveOutcome.of(Status.INFEASIBLE, OptionalLong.empty(), Why.EXHAUSTED);
      case MODEL_INVALID -> refused(response.getSolutionInfo());
      case UNKNOWN, UNRECOGNIZED -> {
        if (keepsBounds) {
          innerBound(response.getInnerObjectiveLowerBound());
        }
        yield unfinished(Status.UNKNOWN, limits, response.getSolutionInfo());
      }
    };
  }

  private SolveOutcome optimal(CpSolverResponse response) {
    if (objective.isPresent()) {
      innerBound(response.getInnerObjectiveLowerBound());
      return SolveOutcome.of(Status.OPTIMAL, outerBound(), Why.EXHAUSTED);
    }
    return constant
        .map(value -> SolveOutcome.of(Status.OPTIMAL, OptionalLong.of(value), Why.EXHAUSTED))
        .orElse(SolveOutcome.of(Status.FEASIBLE, OptionalLong.empty(), Why.EXHAUSTED));
  }

  private SolveOutcome unfinished(Status status, Limits limits, String said) {
    return limits
        .ended()
        .map(why -> SolveOutcome.of(status, outerBound(), why))
        .orElseGet(
            () ->
                new SolveOutcome(
                    status, outerBound(), Why.REFUSED, "CP-SAT gave up without a limit: " + said));
  }

  private static SolveOutcome refused(String said) {
    return new SolveOutcome(
        Status.UNKNOWN, OptionalLong.empty(), Why.REFUSED, "CP-SAT refuses the model: " + said);
  }

  private OptionalLong outerBound() {
    return bound.isPresent() && objective.isPresent()
        ? OptionalLong.of(objective.get().outer(bound.getAsLong()))
        : OptionalLong.empty();
  }

  @Override
  public void solution(SolutionCallback at) {
    solution(at::solutionIntegerValue);
    double proved = at.bestObjectiveBound();
    if (objective.isPresent() && Math.abs(proved) <= EXACT && proved == Math.rint(proved)) {
      innerBound((long) proved);
    }
  }

  /** Tells of a solution if it is the first, or better than the best so far. */
  private void solution(IntToLongFunction byPlace) {
    OptionalLong inner =
        objective.map(o -> OptionalLong.of(o.inner(byPlace, instance.places()))).orElse(best);
    boolean better = inner.isPresent() && inner.getAsLong() < best.orElse(Long.MAX_VALUE);
    if (!solved || better) {
      solved = true;
      best = inner;
      monitor.solution(decisions.at(byPlace));
    }
  }

  /** Hears of a bound; what no sum can reach is the library's infinity. */
  private void innerBound(long inner) {
    boolean tighter = bound.isEmpty() || inner > bound.getAsLong();
    if (objective.isPresent() && tighter && Math.abs(inner) <= LinearSum.LIMIT) {
      bound = OptionalLong.of(inner);
      monitor.bound(objective.get().outer(inner));
    }
  }

  @Override
  public void line(String line) {
    ProgressLine.phase(line).ifPresent(monitor::phase);
    keepsBounds |= ProgressLine.keepsBounds(line);
    ProgressLine.bound(line).ifPresent(this::innerBound);
  }
}
