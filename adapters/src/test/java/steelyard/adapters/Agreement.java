package steelyard.adapters;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.ServiceLoader;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Status;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.Objective;
import steelyard.variants.model.Posting;
import steelyard.variants.model.Variables;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;
import steelyard.variants.model.judge.FlatJudge;
import steelyard.variants.model.sample.Sketch;

/**
 * Whether everything agrees on a small model: the formulas as written, judged on every assignment,
 * what normalising made of them, and every backend at settings drawn from a seed; and the same with
 * each posting negated.
 */
final class Agreement {
  private static final long SECONDS = 60;

  private final List<Backend> backends;
  private final long seed;

  private Agreement(List<Backend> backends, long seed) {
    this.backends = backends;
    this.seed = seed;
  }

  /** The backends that solve in this process. */
  static List<Backend> backends() {
    List<Backend> backends = new ArrayList<>();
    ServiceLoader.load(Backend.class).forEach(backends::add);
    backends.removeIf(backend -> backend.describe().name().equals("program"));
    return backends;
  }

  /** What disagrees; empty if nothing does. */
  static Optional<String> broken(Sketch sketch, List<Backend> backends, long seed) {
    return new Agreement(backends, seed).broken(sketch);
  }

  private Optional<String> broken(Sketch sketch) {
    Optional<String> wrong = broken(sketch.model(), backends);
    for (int i = 0; i < sketch.postings().size() && wrong.isEmpty(); i++) {
      int number = i;
      Backend one = backends.get(Math.floorMod(seed + i, backends.size()));
      wrong =
          negated(sketch, i)
              .flatMap(model -> broken(model, List.of(one)))
              .map(what -> "with posting " + number + " negated: " + what);
    }
    return wrong;
  }

  /** Empty where the negation could overflow and is refused. */
  private static Optional<Model> negated(Sketch sketch, int posting) {
    try {
      return Optional.of(sketch.negating(posting).model());
    } catch (steelyard.variants.model.build.ModelException e) {
      return Optional.empty();
    }
  }

  /** The solutions by decisions, and the best objective of them. */
  private record Truth(Set<Ints> solutions, OptionalLong best) {}

  private Optional<String> broken(Model model, List<Backend> asked) {
    Set<Ints> solutions = new HashSet<>();
    OptionalLong best = OptionalLong.empty();
    Evaluator evaluator = new Evaluator(model);
    for (int[] decisions : assignments(model.variables())) {
      Judgement judgement = evaluator.judge(decisions);
      if (judgement.isValid() != flat(model, decisions)) {
        return Optional.of(
            "normalising: " + Ints.of(decisions) + " as written is " + judgement.isValid());
      }
      if (judgement.isValid()) {
        solutions.add(Ints.of(decisions));
        best = better(model, best, judgement.objective());
      }
    }
    Truth truth = new Truth(solutions, best);
    return asked.stream().flatMap(backend -> broken(model, backend, truth).stream()).findFirst();
  }

  private static OptionalLong better(Model model, OptionalLong best, OptionalLong value) {
    if (model.objective().isEmpty()) {
      return best;
    }
    Objective.Sense sense = model.objective().get().sense();
    return best.isEmpty() || sense.better(value.getAsLong(), best.getAsLong()) ? value : best;
  }

  private static boolean flat(Model model, int[] decisions) {
    Variables variables = model.variables();
    int[] values = new int[variables.size()];
    for (int i = 0; i < decisions.length; i++) {
      values[variables.decisions().get(i)] = decisions[i];
    }
    FlatJudge judge = new FlatJudge(values);
    model.postings().forEach(posting -> judge.complete(posting.definitions(), variables::domain));
    return model.postings().stream()
        .map(Posting::asserted)
        .allMatch(asserted -> asserted.stream().allMatch(judge.relations()::holds));
  }

  private static List<int[]> assignments(Variables variables) {
    List<int[]> all = new ArrayList<>(List.of(new int[0]));
    for (int variable : variables.decisions().toArray()) {
      List<int[]> longer = new ArrayList<>();
      for (int[] prefix : all) {
        variables.domain(variable).stream().forEach(value -> longer.add(joined(prefix, value)));
      }
      all = longer;
    }
    return all;
  }

  private static int[] joined(int[] prefix, int value) {
    return IntStream.concat(IntStream.of(prefix), IntStream.of(value)).toArray();
  }

  private Optional<String> broken(Model model, Backend backend, Truth truth) {
    Map<String, String> options = options(backend);
    String who = backend.describe().name() + " " + options + " seed " + seed % 3 + ": ";
    Goal goal =
        model.objective().isPresent()
            ? new Goal.Optimise()
            : new Goal.Enumerate(model.variables().decisions(), Long.MAX_VALUE);
    Ear ear = new Ear();
    try {
      Optional<SolveOutcome> outcome = ask(backend, options, model, goal, ear);
      return outcome
          .flatMap(it -> model.objective().isPresent() ? optimum(it, truth) : set(it, ear, truth))
          .map(what -> who + what);
    } catch (RuntimeException | LinkageError | AssertionError | StackOverflowError e) {
      return Optional.of(who + "threw " + e);
    }
  }

  /**
   * Options drawn among those that have few values: of CP-SAT one, since its library ends the
   * process by a segmentation fault at some combinations; of our own solvers all.
   */
  private Map<String, String> options(Backend backend) {
    SplittableRandom random = new SplittableRandom(seed);
    List<Setting> few =
        backend.describe().settings().stream()
            .filter(s -> s.kind() == Setting.Kind.SWITCH || s.kind() == Setting.Kind.CHOICE)
            .toList();
    boolean foreign = backend.describe().name().equals("cpsat");
    int only = few.isEmpty() ? 0 : random.nextInt(few.size());
    Map<String, String> options = new TreeMap<>();
    for (int i = 0; i < few.size(); i++) {
      if (!foreign || i == only) {
        options.put(few.get(i).name(), value(few.get(i), random));
      }
    }
    return options;
  }

  private static String value(Setting setting, SplittableRandom random) {
    return setting.kind() == Setting.Kind.SWITCH
        ? Boolean.toString(random.nextBoolean())
        : setting.choices().get(random.nextInt(setting.choices().size()));
  }

  private static Optional<String> optimum(SolveOutcome outcome, Truth truth) {
    Status expected = truth.best().isPresent() ? Status.OPTIMAL : Status.INFEASIBLE;
    boolean agreed =
        outcome.status() == expected
            && (truth.best().isEmpty() || outcome.bound().equals(truth.best()));
    return agreed
        ? Optional.empty()
        : Optional.of(outcome + ", but the optimum is " + truth.best());
  }

  private static Optional<String> set(SolveOutcome outcome, Ear ear, Truth truth) {
    boolean agreed =
        outcome.ended() == SolveOutcome.Why.EXHAUSTED
            && ear.solutions.size() == truth.solutions().size()
            && truth.solutions().equals(new HashSet<>(ear.solutions));
    return agreed
        ? Optional.empty()
        : Optional.of(
            outcome + " with " + ear.solutions + ", but the solutions are " + truth.solutions());
  }

  /** Empty where the backend refuses the model by name. */
  private Optional<SolveOutcome> ask(
      Backend backend, Map<String, String> options, Model model, Goal goal, Ear ear) {
    long seeding = seed % 3;
    Seeding seeded = Seeding.of(model, seeding);
    Settings settings = Settings.of(backend.describe(), options);
    SolveRequest request = new SolveRequest(settings, seeding, 1, new Minute());
    Monitor monitor = seeded.monitor(ear);
    Lowered lowered = backend.lower(seeded.model(), request, monitor);
    if (lowered instanceof Refusal) {
      return Optional.empty();
    }
    try (Lowering lowering = (Lowering) lowered) {
      return Optional.of(lowering.solve(seeded.goal(goal), monitor));
    }
  }

  private static final class Ear implements Monitor {
    private final List<Ints> solutions = new ArrayList<>();

    @Override
    public void phase(String name) {}

    @Override
    public void solution(int[] decisions) {
      solutions.add(Ints.of(decisions));
    }

    @Override
    public void bound(long value) {}

    @Override
    public void count(String counter, long value) {}

    @Override
    public void blame(String measure, Longs byPosting) {}
  }

  private static final class Minute implements Deadline {
    private final long end = System.nanoTime() + SECONDS * 1_000_000_000;

    @Override
    public long nanosLeft() {
      return end - System.nanoTime();
    }

    @Override
    public Optional<Work> work() {
      return Optional.empty();
    }

    @Override
    public boolean stopAsked() {
      return nanosLeft() <= 0;
    }

    @Override
    public void onStop(Runnable wake) {}
  }
}
