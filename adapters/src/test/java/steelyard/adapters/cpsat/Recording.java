package steelyard.adapters.cpsat;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;
import steelyard.adapters.spi.Monitor;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;

/** A monitor that keeps what it hears. */
final class Recording implements Monitor {
  final List<String> phases = new ArrayList<>();
  final List<Ints> solutions = new ArrayList<>();
  final List<Long> bounds = new ArrayList<>();
  final SortedMap<String, Long> counters = new TreeMap<>();
  private final Consumer<String> atPhase;
  private final Runnable atSolution;

  Recording() {
    this(phase -> {}, () -> {});
  }

  /** One that also does something at each phase and at each solution. */
  Recording(Consumer<String> atPhase, Runnable atSolution) {
    this.atPhase = atPhase;
    this.atSolution = atSolution;
  }

  @Override
  public void phase(String name) {
    phases.add(name);
    atPhase.accept(name);
  }

  @Override
  public void solution(int[] decisions) {
    solutions.add(Ints.of(decisions));
    atSolution.run();
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
    throw new AssertionError("CP-SAT blames nobody");
  }

  int[] last() {
    return solutions.get(solutions.size() - 1).toArray();
  }
}
