package steelyard.harness.worker;

import java.io.IOException;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Supplier;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Printable;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Posting;
import steelyard.variants.model.judge.Evaluator;

/** One run: read, build, shuffle, lower, solve; every step said as it begins. */
final class Run {
  private final RunOrder order;
  private final EventWriter events;
  private final Lifeline lifeline;

  Run(RunOrder order, EventWriter events, Lifeline lifeline) {
    this.order = order;
    this.events = events;
    this.lifeline = lifeline;
  }

  /** Solves. */
  void solve() {
    Prepared prepared = prepare();
    try (RunDeadline deadline = begin();
        Lowering lowering = lower(prepared, deadline)) {
      events.phase(Phases.SOLVE);
      Monitor monitor = prepared.seeding().monitor(new Telling(prepared.model()));
      Goal goal = prepared.seeding().goal(goal(prepared.model()));
      SolveOutcome outcome = guarded(() -> lowering.solve(goal, monitor));
      events.flush();
      events.phase(Phases.ANSWER);
      events.write(new Event.Result(outcome));
      requireAnswered(outcome);
    }
  }

  private static void requireAnswered(SolveOutcome outcome) {
    if (outcome.ended() == SolveOutcome.Why.REFUSED) {
      throw new WorkerException(Event.Failure.Kind.UNSUPPORTED, outcome.reason());
    }
    if (outcome.ended() == SolveOutcome.Why.FAILED) {
      throw new WorkerException(Event.Failure.Kind.BACKEND, outcome.reason());
    }
  }

  /** Lowers, says the sizes and, where a format is asked for, writes what the solver would get. */
  void print(String format, Path to) throws IOException {
    Prepared prepared = prepare();
    try (RunDeadline deadline = begin();
        Lowering lowering = lower(prepared, deadline)) {
      if (format.isEmpty()) {
        return;
      }
      Printable printable =
          lowering
              .facet(Printable.class)
              .filter(p -> p.formats().contains(format))
              .orElseThrow(() -> noFormat(format, lowering));
      Path beside = to.resolveSibling(to.getFileName() + ".part");
      try (Writer writer = Files.newBufferedWriter(beside, StandardCharsets.UTF_8)) {
        printable.print(format, writer);
      }
      Files.move(beside, to, StandardCopyOption.REPLACE_EXISTING);
    }
  }

  private WorkerException noFormat(String format, Lowering lowering) {
    String known = lowering.facet(Printable.class).map(p -> p.formats().toString()).orElse("none");
    return new WorkerException(
        Event.Failure.Kind.BAD_INPUT,
        order.backend() + " cannot write '" + format + "'; formats: " + known);
  }

  private record Prepared(Backend backend, Settings settings, Model model, Seeding seeding) {}

  private Prepared prepare() {
    events.phase(Phases.LOAD);
    Backend backend = Registry.backend(order.backend());
    order.work().ifPresent(work -> requireUnit(backend.describe(), work.unit()));
    Settings settings = settings(backend.describe(), order.settings());
    Optional<Refusal> missing = guarded(backend::load);
    if (missing.isPresent()) {
      throw new WorkerException(Event.Failure.Kind.UNSUPPORTED, missing.get().reason());
    }
    Subject.OfVariant subject = (Subject.OfVariant) order.subject();
    Built<?> built = Built.read(subject);
    events.phase(Phases.BUILD);
    Model model = built.model(subject.amendments());
    events.write(new Event.Built(Built.facts(model, 0)));
    events.phase(Phases.SHUFFLE);
    return new Prepared(backend, settings, model, Seeding.of(model, order.seed()));
  }

  static Settings settings(Description backend, Map<String, String> given) {
    try {
      return Settings.of(backend, given);
    } catch (IllegalArgumentException e) {
      throw new WorkerException(Event.Failure.Kind.BAD_INPUT, e.getMessage(), e);
    }
  }

  private static void requireUnit(Description backend, String unit) {
    if (!backend.workUnits().contains(unit)) {
      throw new WorkerException(
          Event.Failure.Kind.BAD_INPUT,
          backend.name() + " has no work in '" + unit + "'; it has: " + backend.workUnits());
    }
  }

  private RunDeadline begin() {
    events.phase(Phases.LOWER);
    return new RunDeadline(order.wallSeconds(), order.work(), lifeline);
  }

  private Lowering lower(Prepared prepared, RunDeadline deadline) {
    SolveRequest request =
        new SolveRequest(
            prepared.settings(),
            order.seed(),
            order.threads(),
            deadline,
            new RunPrograms(lifeline));
    Monitor monitor = prepared.seeding().monitor(new Telling(prepared.model()));
    Lowered lowered =
        guarded(() -> prepared.backend().lower(prepared.seeding().model(), request, monitor));
    if (lowered instanceof Refusal refusal) {
      throw new WorkerException(Event.Failure.Kind.UNSUPPORTED, refusal.reason());
    }
    Lowering lowering = (Lowering) lowered;
    events.write(sizes(lowering.sizes(), prepared.model()));
    return lowering;
  }

  private static Event sizes(Sizes sizes, Model model) {
    SortedMap<String, Long> byGroup = new TreeMap<>();
    Longs byPosting = sizes.byPosting();
    for (Posting posting : model.postings()) {
      if (posting.id() < byPosting.size() && byPosting.get(posting.id()) != 0) {
        byGroup.merge(posting.origin().qualifiedGroup(), byPosting.get(posting.id()), Long::sum);
      }
    }
    return new Event.Lowered(sizes.totals(), sizes.unit(), byGroup, sizes.how());
  }

  private Goal goal(Model model) {
    boolean optimise = model.objective().isPresent();
    return switch (order
        .goal()
        .orElse(optimise ? RunOrder.GoalKind.OPTIMISE : RunOrder.GoalKind.SATISFY)) {
      case SATISFY -> new Goal.Satisfy();
      case OPTIMISE -> optimise ? new Goal.Optimise() : new Goal.Satisfy();
      case ENUMERATE ->
          new Goal.Enumerate(model.variables().decisions(), Math.max(1, order.enumerateAtMost()));
    };
  }

  /** A library that does not link is unsupported; anything else that is thrown is the backend's. */
  private <T> T guarded(Supplier<T> step) {
    try {
      return step.get();
    } catch (LinkageError e) {
      throw new WorkerException(
          Event.Failure.Kind.UNSUPPORTED,
          order.backend() + ": its library cannot be used: " + e,
          e);
    } catch (RuntimeException e) {
      throw new WorkerException(Event.Failure.Kind.BACKEND, order.backend() + " threw " + e, e);
    }
  }

  /** Says what the backend says. */
  private final class Telling implements Monitor {
    private final Evaluator evaluator;

    Telling(Model model) {
      this.evaluator = new Evaluator(model);
    }

    @Override
    public void phase(String name) {
      events.write(new Event.Step(name));
    }

    @Override
    public void solution(int[] decisions) {
      events.write(new Event.Solution(evaluator.objectiveOf(decisions), Ints.of(decisions)));
    }

    @Override
    public void bound(long value) {
      events.write(new Event.Bound(value));
    }

    @Override
    public void count(String counter, long value) {
      events.write(new Event.Count(counter, value));
    }

    @Override
    public void blame(String measure, Longs byPosting) {
      events.write(new Event.Blame(measure, byPosting));
    }
  }
}
