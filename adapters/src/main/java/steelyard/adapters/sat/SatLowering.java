package steelyard.adapters.sat;

import java.io.IOException;
import java.util.Collections;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.SortedSet;
import java.util.TreeSet;
import java.util.concurrent.atomic.AtomicBoolean;
import steelyard.adapters.sat.encoding.ClauseSink;
import steelyard.adapters.sat.encoding.DimacsText;
import steelyard.adapters.sat.encoding.EncodingStopped;
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
import steelyard.adapters.spi.Settings;
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
    Settings settings = request.settings();
    long variables = settings.integer(SatBackend.MOST_VARIABLES);
    long clauses = settings.integer(SatBackend.MOST_CLAUSES);
    Deadline deadline = request.deadline();
    monitor.phase("count");
    Limits limits = new Limits(variables, clauses, deadline::stopAsked);
    ModelEncoder counted =
        new ModelEncoder(model, settings.integer(SatBackend.MOST_EDGES), ClauseSink.NONE, limits);
    AtomicBoolean stop = new AtomicBoolean();
    try {
      counted.encode();
      monitor.phase("encode");
      Loaded loaded = load(counted, request, stop);
      return new SatLowering(model, request, counted.sizes(), stop, Optional.of(loaded));
    } catch (EncodingStopped e) {
      return switch (e.why()) {
        case STOP -> new SatLowering(model, request, counted.sizes(), stop, Optional.empty());
        case VARIABLES ->
            new Refusal(tooMany(variables, "variables", SatBackend.MOST_VARIABLES, counted));
        case CLAUSES -> new Refusal(tooMany(clauses, "clauses", SatBackend.MOST_CLAUSES, counted));
      };
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

  private static String tooMany(long most, String what, String setting, ModelEncoder counted) {
    String limit = "sat would need more than " + most + " " + what + " (" + setting + "): ";
    String reached = counted.cnf().variables() + " variables, " + counted.cnf().clauses();
    return limit + reached + " clauses up to " + counted.at();
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
        ? Optional.of(kind.cast(new Dimacs(loaded.get().encoder())))
        : Optional.empty();
  }

  @Override
  public void close() {
    stop.set(true);
    loaded.ifPresent(l -> l.solver().close());
  }

  private final class Dimacs implements Printable {
    private static final String FORMAT = "dimacs";

    private final ModelEncoder encoder;

    Dimacs(ModelEncoder encoder) {
      this.encoder = encoder;
    }

    @Override
    public SortedSet<String> formats() {
      return Collections.unmodifiableSortedSet(new TreeSet<>(Collections.singleton(FORMAT)));
    }

    @Override
    public void print(String format, Appendable to) throws IOException {
      if (!format.equals(FORMAT)) {
        throw new IllegalArgumentException("sat prints dimacs, not '" + format + "'");
      }
      DimacsText.write(model, encoder, sizes, to);
    }
  }
}
