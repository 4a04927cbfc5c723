package steelyard.adapters.program;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.Optional;
import java.util.OptionalLong;
import steelyard.adapters.sat.encoding.ClauseSink;
import steelyard.adapters.sat.encoding.EncodingSettings;
import steelyard.adapters.sat.encoding.EncodingStopped;
import steelyard.adapters.sat.encoding.FormulaText;
import steelyard.adapters.sat.encoding.Limits;
import steelyard.adapters.sat.encoding.ModelEncoder;
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
import steelyard.variants.model.Model;

/** A model's clauses in a file of the run's folder; none where a limit passed while encoding. */
final class ProgramLowering implements Lowering {
  private static final String FILE = "formula.cnf";

  private final Model model;
  private final SolveRequest request;
  private final Template command;
  private final Sizes sizes;
  private final Optional<Written> written;
  private boolean solved;

  /** The formula in its file, and what its literals mean. */
  private record Written(ModelEncoder encoder, CnfFile formula) {}

  private ProgramLowering(
      Model model, SolveRequest request, Template command, Sizes sizes, Optional<Written> written) {
    this.model = model;
    this.request = request;
    this.command = command;
    this.sizes = sizes;
    this.written = written;
  }

  static Lowered of(Model model, SolveRequest request, Template command, Monitor monitor) {
    EncodingSettings settings = EncodingSettings.of(request.settings());
    monitor.phase("count");
    ModelEncoder counted =
        new ModelEncoder(
            model,
            settings.mostEdges(),
            ClauseSink.NONE,
            settings.limits(request.deadline()::stopAsked));
    try {
      counted.encode();
      monitor.phase("encode");
      Written written = write(counted, request);
      return new ProgramLowering(model, request, command, counted.sizes(), Optional.of(written));
    } catch (EncodingStopped e) {
      return e.why() == EncodingStopped.Why.STOP
          ? new ProgramLowering(model, request, command, counted.sizes(), Optional.empty())
          : settings.tooLarge(ProgramBackend.NAME, e.why(), counted);
    } catch (IOException | UncheckedIOException e) {
      return new Refusal("program cannot write " + FILE + ": " + e.getMessage());
    }
  }

  private static Written write(ModelEncoder counted, SolveRequest request) throws IOException {
    int variables = counted.cnf().variables();
    Path file = request.programs().folder().resolve(FILE);
    CnfFile formula = CnfFile.create(file, variables);
    try {
      Limits limits = new Limits(variables, Long.MAX_VALUE, request.deadline()::stopAsked);
      ModelEncoder encoder = counted.into(formula, limits);
      encoder.encode();
      encoder.cnf().liftLimits();
      formula.complete();
      return new Written(encoder, formula);
    } catch (IOException | RuntimeException e) {
      formula.close();
      throw e;
    }
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
    if (written.isEmpty()) {
      return SolveOutcome.of(
          Status.UNKNOWN, OptionalLong.empty(), Search.stopped(request.deadline()));
    }
    monitor.phase("search");
    Calls calls = new Calls(command, request);
    Written it = written.get();
    try {
      return new Search(model, it.encoder(), it.formula(), calls, request.deadline(), monitor)
          .run(goal);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    } finally {
      calls.counters().forEach(monitor::count);
    }
  }

  @Override
  public <F extends Facet> Optional<F> facet(Class<F> kind) {
    return kind == Printable.class && written.isPresent()
        ? Optional.of(kind.cast(new FormulaText(model, written.get().encoder(), sizes)))
        : Optional.empty();
  }

  @Override
  public void close() {
    written.ifPresent(it -> it.formula().close());
  }
}
