package steelyard.adapters.engine;

import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.propagators.Level;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Facet;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;

/** A model as a network of the engine. */
final class EngineLowering implements Lowering {
  private static final String UNIT = "constraints";

  private final Model model;
  private final SolveRequest request;
  private final Store store = new Store();
  private final Network network = new Network(store);
  private final Places places;
  private final ConstraintPosting constraints;
  private final long[] byPosting;
  private boolean complete = true;
  private boolean solved;

  private EngineLowering(Model model, SolveRequest request) {
    this.model = model;
    this.request = request;
    places = new Places(network, model);
    boolean domain =
        request.settings().text(EngineBackend.ALL_DIFFERENT).equals(EngineBackend.DOMAIN);
    constraints = new ConstraintPosting(places, network, domain ? Level.DOMAIN : Level.BOUNDS);
    byPosting = new long[model.postings().size()];
  }

  static Lowered of(Model model, SolveRequest request, Monitor monitor) {
    Optional<Work> work = request.deadline().work();
    if (work.isPresent() && !isUnit(work.get().unit())) {
      return new Refusal("engine counts work in failures or decisions, not " + work.get().unit());
    }
    monitor.phase("post");
    EngineLowering lowering = new EngineLowering(model, request);
    for (Posting posting : model.lowered()) {
      if (request.deadline().stopAsked()) {
        lowering.complete = false;
        break;
      }
      try {
        lowering.post(posting);
      } catch (OutOfRange e) {
        return new Refusal("engine cannot take " + posting.origin() + ": " + e.getMessage());
      }
    }
    return lowering;
  }

  private static boolean isUnit(String unit) {
    return unit.equals(EngineBackend.FAILURES) || unit.equals(EngineBackend.DECISIONS);
  }

  private void post(Posting posting) {
    int before = network.size();
    posting.definitions().forEach(d -> constraints.post(d.constraint(), posting.id()));
    posting.asserted().forEach(c -> constraints.post(c, posting.id()));
    byPosting[posting.id()] = (long) network.size() - before;
  }

  @Override
  public Sizes sizes() {
    SortedMap<String, Long> totals = new TreeMap<>();
    totals.put("variables", store.variables() - 1L);
    totals.put(UNIT, (long) network.size());
    return new Sizes(totals, UNIT, Longs.of(byPosting), constraints.how());
  }

  @Override
  public SolveOutcome solve(Goal goal, Monitor monitor) {
    if (solved) {
      throw new IllegalStateException("a lowering is solved once");
    }
    solved = true;
    Deadline deadline = request.deadline();
    if (!complete || deadline.stopAsked()) {
      return SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), Solving.stopped(deadline));
    }
    monitor.phase("search");
    return new Solving(model, network, places, request, monitor).run(goal);
  }

  @Override
  public <F extends Facet> Optional<F> facet(Class<F> kind) {
    return Optional.empty();
  }

  @Override
  public void close() {}
}
