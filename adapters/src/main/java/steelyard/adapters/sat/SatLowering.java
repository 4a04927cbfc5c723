package steelyard.adapters.sat;

import java.util.Optional;
import java.util.OptionalLong;
import java.util.concurrent.atomic.AtomicBoolean;
import steelyard.adapters.sat.encoding.ClauseSink;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.sat.encoding.EncodingStopped;
import steelyard.adapters.sat.encoding.FormulaText;
import steelyard.adapters.sat.encoding.Limits;
import steelyard.adapters.sat.encoding.ModelEncoder;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Facet;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Model;

/** A model's clauses in a solver; without solver where a limit passed while encoding. */
final class SatLowering implements Lowering {
  private final Model model;
  private final SolveRequest request;
  private final Sizes sizes;
  private final AtomicBoolean stop;
  private final Optional<Loaded> loaded;
  private boolean solved;

  /** The formula in the solver, and what its literals mean. */
  private record Loaded(ModelEncoder encoder, SatSolver solver) {}

  private SatLowering(
      Model model, SolveRequest request, Sizes sizes, AtomicBoolean stop, Optional<Loaded> loaded) {
    this.model = model;
    this.request = request;
    this.sizes = sizes;
    this.stop = stop;
    this.loaded = loaded;
  }

  static Lowered of(Model model, SolveRequest request, Monitor monitor) {
    Optional<Work> work = request.deadline().work();
    if (work.isPresent() && !work.get().unit().equals(SatBackend.CONFLICTS)) {
      return new Refusal("sat counts work in conflicts, not in " + work.get().unit());
    }
    EncodingSettings settings = EncodingSettings.of(request.settings());
    Deadline deadline = request.deadline();
    monitor.phase("count");
    ModelEncoder counted =
        new ModelEncoder(
            model, settings.mostEdges(), ClauseSink.NONE, settings.limits(deadline::stopAsked));
    AtomicBoolean stop = new AtomicBoolean();
    try {
      counted.encode();
      monitor.phase("encode");
      Loaded loaded = load(counted, request, stop);
      return new SatLowering(model, request, counted.sizes(), stop, Optional.of(loaded));
    } catch (EncodingStopped e) {
      return e.why() == EncodingStopped.Why.STOP
          ? new SatLowering(model, request, counted.sizes(), stop, Optional.empty())
          : settings.tooLarge("sat", e.why(), counted);
    }
  }

  private static Loaded load(ModelEncoder counted, SolveRequest request, AtomicBoolean stop) {
    int variables = counted.cnf().variables();
    String configuration = request.settings().text(SatBackend.SOLVER);
    long conflicts =
        request.deadline().work().map(w -> (long) Math.ceil(w.amount())).orElse(Long.MAX_VALUE);
    SatSolver solver = new SatSolver(configuration, variables, stop, conflicts);
    Limits limits = new Limits(variables, Long.MAX_VALUE, request.deadline()::stopAsked);
    ModelEncoder encoder = counted.into(solver, limits);
    encoder.encode();
    encoder.cnf().liftLimits();
    return new Loaded(encoder, solver);
  }

  @Override
  public Sizes sizes() {
    return sizes;
  }

  @Override
  public SolveOutcome solve(Goal goal, Monitor monitor) {
    if (solved) {
      throw new IllegalStateException("a lowering is solved once");
    }
    solved = true;
    Deadline deadline = request.deadline();
    deadline.onStop(() -> stop.set(true));
    if (loaded.isEmpty() || deadline.stopAsked()) {
      return SolveOutcome.of(Status.UNKNOWN, OptionalLong.empty(), Search.stopped(deadline));
    }
    monitor.phase("search");
    SatSolver solver = loaded.get().solver();
    Search search = new Search(model, loaded.get().encoder(), solver, deadline, monitor);
    try {
      return search.run(goal);
    } finally {
      solver.counters().forEach(monitor::count);
    }
  }

  @Override
  public <F extends Facet> Optional<F> facet(Class<F> kind) {
    return kind == Printable.class && loaded.isPresent()
        ? Optional.of(kind.cast(new FormulaText(model, loaded.get().encoder(), sizes)))
        : Optional.empty();
  }

  @Override
  public void close() {
    stop.set(true);
    loaded.ifPresent(l -> l.solver().close());
  }
}
