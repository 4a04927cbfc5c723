package steelyard.adapters.engine;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.concurrent.atomic.AtomicLong;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;

/** What the engine says of a model, in tests. */
final class Solved implements Monitor {
  static final EngineBackend BACKEND = new EngineBackend();

  final List<Ints> solutions = new ArrayList<>();
  final List<Long> bounds = new ArrayList<>();
  final SortedMap<String, Long> counters = new TreeMap<>();
  final SortedMap<String, Longs> blame = new TreeMap<>();
  SolveOutcome outcome;
  Sizes sizes;

  private Solved() {}

  static Solved of(Model model, Goal goal) {
    return of(model, goal, Map.of(), new Looks(Long.MAX_VALUE, Optional.empty()));
  }

  static Solved of(Model model, Goal goal, Map<String, String> settings) {
    return of(model, goal, settings, new Looks(Long.MAX_VALUE, Optional.empty()));
  }

  static Solved of(Model model, Goal goal, Map<String, String> settings, Deadline deadline) {
    Solved solved = new Solved();
    SolveRequest request = request(settings, 0, deadline);
    try (Lowering lowering = (Lowering) BACKEND.lower(model, request, solved)) {
      solved.sizes = lowering.sizes();
      solved.outcome = lowering.solve(goal, solved);
    }
    return solved;
  }

  static SolveRequest request(Map<String, String> settings, long seed, Deadline deadline) {
    return new SolveRequest(Settings.of(BACKEND.describe(), settings), seed, 1, deadline);
  }

  /** Every solution, each once as seen on the decisions. */
  static Goal all(Model model) {
    return new Goal.Enumerate(model.variables().decisions(), Long.MAX_VALUE);
  }

  @Override
  public void phase(String name) {}

  @Override
  public void solution(int[] decisions) {
    solutions.add(Ints.of(decisions));
  }

  @Override
  public void bound(long value) {
    bounds.add(value);
  }

  @Override
  public void count(String counter, long value) {
    counters.put(counter, value);
  }

  @Override
  public void blame(String measure, Longs byPosting) {
    blame.put(measure, byPosting);
  }

  /** A deadline without a clock: it says stop from a given look on. */
  static final class Looks implements Deadline {
    private final AtomicLong left;
    private final Optional<Work> work;

    Looks(long looks, Optional<Work> work) {
      left = new AtomicLong(looks);
      this.work = work;
    }

    static Looks work(String unit, double amount) {
      return new Looks(Long.MAX_VALUE, Optional.of(new Work(unit, amount)));
    }

    @Override
    public long nanosLeft() {
      return Long.MAX_VALUE;
    }

    @Override
    public Optional<Work> work() {
      return work;
    }

    @Override
    public boolean stopAsked() {
      return left.getAndUpdate(looks -> Math.max(0, looks - 1)) <= 0;
    }

    @Override
    public void onStop(Runnable wake) {}
  }
}
