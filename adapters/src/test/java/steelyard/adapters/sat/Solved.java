package steelyard.adapters.sat;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.Sizes;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;

/** A model solved by the backend, and all that it told on the way. */
final class Solved implements Monitor {
  static final SatBackend BACKEND = new SatBackend();

  final List<Ints> solutions = new ArrayList<>();
  final List<Long> bounds = new ArrayList<>();
  final SortedMap<String, Long> counters = new TreeMap<>();
  private final Consumer<Solved> atSolution;
  SolveOutcome outcome;
  Sizes sizes;

  private Solved(Consumer<Solved> atSolution) {
    this.atSolution = atSolution;
  }

  static Solved of(Model model, Goal goal) {
    return of(model, goal, Map.of(), TestDeadline.none(), solved -> {});
  }

  static Solved of(Model model, Goal goal, Map<String, String> settings) {
    return of(model, goal, settings, TestDeadline.none(), solved -> {});
  }

  static Solved of(Model model, Goal goal, Deadline deadline) {
    return of(model, goal, Map.of(), deadline, solved -> {});
  }

  static Solved of(
      Model model,
      Goal goal,
      Map<String, String> settings,
      Deadline deadline,
      Consumer<Solved> atSolution) {
    Solved solved = new Solved(atSolution);
    Lowered lowered = BACKEND.lower(model, request(settings, deadline), solved);
    assertThat(lowered).isInstanceOf(Lowering.class);
    try (Lowering lowering = (Lowering) lowered) {
      solved.sizes = lowering.sizes();
      solved.outcome = lowering.solve(goal, solved);
    }
    return solved;
  }

  /** Hears what a lowering says that is not solved here. */
  static Solved listener() {
    return new Solved(solved -> {});
  }

  static SolveRequest request(Map<String, String> settings, Deadline deadline) {
    return new SolveRequest(Settings.of(BACKEND.describe(), settings), 0, 1, deadline);
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
    atSolution.accept(this);
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
  public void blame(String measure, Longs byPosting) {}
}
