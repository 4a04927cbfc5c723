package steelyard.adapters.engine;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalLong;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Stop;
import steelyard.adapters.engine.search.Counters;
import steelyard.adapters.engine.search.Ending;
import steelyard.adapters.engine.search.Limits;
import steelyard.adapters.engine.search.Objective;
import steelyard.adapters.engine.search.Restarts;
import steelyard.adapters.engine.search.Search;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveOutcome.Why;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;

/** One solve: the goal as a search, and what comes of it in the model's terms. */
final class Solving {
  private final Model model;
  private final Network network;
  private final Places places;
  private final Settings settings;
  private final Deadline deadline;
  private final Monitor monitor;
  private final Guide guide;

  Solving(Model model, Network network, Places places, SolveRequest request, Monitor monitor) {
    this.model = model;
    this.network = network;
    this.places = places;
    this.settings = request.settings();
    this.deadline = request.deadline();
    this.monitor = monitor;
    boolean follow = settings.text(EngineBackend.BRANCHING).equals(EngineBackend.MODEL);
    guide = new Guide(network, places, model, follow, request.seed());
  }

  SolveOutcome run(Goal goal) {
    if (goal instanceof Goal.Enumerate all) {
      return enumerate(all.projection(), all.atMost());
    }
    return goal instanceof Goal.Optimise && model.objective().isPresent()
        ? optimise(model.objective().get())
        : satisfy();
  }

  private SolveOutcome satisfy() {
    Search search = new Search(network, guide.everything(Optional.empty()));
    search.restarting(restarts());
    Ending ending = run(search, limits().withSolutions(1));
    return outcome(search, ending, OptionalLong.empty());
  }

  private SolveOutcome enumerate(Ints projection, long atMost) {
    for (int i = 0; i < projection.size(); i++) {
      if (!places.has(projection.get(i))) {
        String name = model.variables().name(projection.get(i));
        return new SolveOutcome(
            Status.UNKNOWN,
            OptionalLong.empty(),
            Why.REFUSED,
            "variable " + name + " is defined, but nothing uses it: engine does not lower it");
      }
    }
    Search search = new Search(network, guide.everything(Optional.empty()));
    search.projectedOn(guide.only(projection));
    Ending ending = run(search, limits().withSolutions(atMost));
    return outcome(search, ending, OptionalLong.empty());
  }

  private SolveOutcome optimise(steelyard.variants.model.Objective wanted) {
    Cost cost = new Cost(wanted);
    Objective objective = cost.minimise(network, places, model.postings().size());
    Search search = new Search(network, guide.everything(Optional.of(objective)));
    search.minimising(objective).restarting(restarts());
    search.onRoot(s -> monitor.bound(cost.outer(objective.least(s))));
    Ending ending = run(search, limits());
    OptionalLong inner = search.bound();
    OptionalLong bound = inner.isPresent() ? OptionalLong.of(cost.outer(inner.getAsLong())) : inner;
    return outcome(search, ending, bound);
  }

  private Ending run(Search search, Limits most) {
    Stop stop = deadline::stopAsked;
    search.onSolution(
        s -> {
          report();
          return true;
        });
    Ending ending = search.run(most, stop);
    tell(search.counters());
    return ending;
  }

  private void report() {
    monitor.solution(model.variables().decisions().stream().map(places::value).toArray());
  }

  private void tell(Counters counters) {
    monitor.count("decisions", counters.nodes());
    monitor.count("failures", counters.failures());
    monitor.count("propagations", counters.propagations());
    monitor.count("restarts", counters.restarts());
    monitor.count("depth", counters.depth());
    int postings = model.postings().size();
    monitor.blame("failures", Longs.of(Arrays.copyOf(network.failuresByTag(), postings)));
    monitor.blame("propagations", Longs.of(Arrays.copyOf(network.propagationsByTag(), postings)));
  }

  private Limits limits() {
    Optional<Work> work = deadline.work();
    if (work.isEmpty()) {
      return Limits.NONE;
    }
    long amount = (long) Math.ceil(work.get().amount());
    return work.get().unit().equals(EngineBackend.DECISIONS)
        ? Limits.NONE.withNodes(amount)
        : Limits.NONE.withFailures(amount);
  }

  private Restarts restarts() {
    long scale = settings.integer(EngineBackend.SCALE);
    return switch (settings.text(EngineBackend.RESTARTS)) {
      case EngineBackend.NEVER -> Restarts.never();
      case EngineBackend.LUBY -> Restarts.luby(scale);
      case EngineBackend.GEOMETRIC ->
          Restarts.geometric(scale, settings.real(EngineBackend.FACTOR));
      default -> guide.isModels() ? Restarts.never() : Restarts.luby(scale);
    };
  }

  private SolveOutcome outcome(Search search, Ending ending, OptionalLong bound) {
    boolean found = search.counters().solutions() > 0;
    boolean exhausted = ending == Ending.EXHAUSTED;
    Status none = exhausted ? Status.INFEASIBLE : Status.UNKNOWN;
    Status some = exhausted && bound.isPresent() ? Status.OPTIMAL : Status.FEASIBLE;
    Why why =
        switch (ending) {
          case EXHAUSTED, SOLUTIONS -> Why.EXHAUSTED;
          case NODES, FAILURES -> Why.WORK;
          case STOPPED -> stopped(deadline);
        };
    return SolveOutcome.of(found ? some : none, bound, why);
  }

  /** Why a run was stopped. */
  static Why stopped(Deadline deadline) {
    return deadline.nanosLeft() <= 0 ? Why.WALL : Why.STOPPED;
  }
}
