package steelyard.adapters.cpsat;

import java.util.Optional;
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
import steelyard.variants.model.Model;

/** A model as the library's message, to be solved once. */
final class CpSatLowering implements Lowering {
  private final Instance instance;
  private final SolveRequest request;
  private boolean solved;

  private CpSatLowering(Instance instance, SolveRequest request) {
    this.instance = instance;
    this.request = request;
  }

  static Lowered of(Model model, SolveRequest request, Monitor monitor) {
    Optional<String> wrongUnit = WorkUnits.refusal(request);
    if (wrongUnit.isPresent()) {
      return new Refusal(wrongUnit.get());
    }
    monitor.phase("load");
    Optional<String> notLoaded = NativeLibrary.load();
    if (notLoaded.isPresent()) {
      return new Refusal(notLoaded.get());
    }
    monitor.phase("encode");
    Instance instance = new ModelLowering(model, request).lower();
    if (instance.sizes().totals().get("bytes") < 0) {
      return new Refusal("cpsat reads models of at most 2 GiB, and this one is larger");
    }
    return new CpSatLowering(instance, request);
  }

  @Override
  public Sizes sizes() {
    return instance.sizes();
  }

  @Override
  public SolveOutcome solve(Goal goal, Monitor monitor) {
    if (solved) {
      throw new IllegalStateException("a lowering is solved once");
    }
    solved = true;
    return goal instanceof Goal.Enumerate all
        ? new Enumeration(instance, request.deadline(), all, monitor).run()
        : new Search(instance, request, goal, monitor).run();
  }

  @Override
  public <F extends Facet> Optional<F> facet(Class<F> kind) {
    return kind == Printable.class
        ? Optional.of(kind.cast(new ProtoText(instance)))
        : Optional.empty();
  }

  @Override
  public void close() {
    // The library's objects are freed when a call has returned and nobody can stop it any more.
  }
}
