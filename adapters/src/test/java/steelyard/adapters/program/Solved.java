package steelyard.adapters.program;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.BooleanSupplier;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.TestPrograms;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;

/** A model solved by a program, and all that was told on the way. */
final class Solved implements Monitor {
  static final ProgramBackend BACKEND = new ProgramBackend();

  final List<Ints> solutions = new ArrayList<>();
  final List<Long> bounds = new ArrayList<>();
  final SortedMap<String, Long> counters = new TreeMap<>();
  SolveOutcome outcome;

  static Solved by(String command, Model model, Goal goal, Path folder) {
    return by(request(command, 0, NO_LIMIT, folder), model, goal);
  }

  static Solved by(SolveRequest request, Model model, Goal goal) {
    Solved solved = new Solved();
    Lowered lowered = BACKEND.lower(model, request, solved);
    assertThat(lowered).isInstanceOf(Lowering.class);
    try (Lowering lowering = (Lowering) lowered) {
      solved.outcome = lowering.solve(goal, solved);
    }
    return solved;
  }

  static Lowered lower(SolveRequest request, Model model) {
    return BACKEND.lower(model, request, new Solved());
  }

  static SolveRequest request(String command, long seed, Deadline deadline, Path folder) {
    Settings settings = Settings.of(BACKEND.describe(), Map.of(ProgramBackend.COMMAND, command));
    return new SolveRequest(settings, seed, 1, deadline, new TestPrograms(folder));
  }

  /** Every solution, each once as seen on the decisions. */
  static Goal all(Model model) {
    return new Goal.Enumerate(model.variables().decisions(), Long.MAX_VALUE);
  }

  static final Deadline NO_LIMIT = new Asking(() -> false, Optional.empty());

  /** At most so many calls. */
  static Deadline calls(long most) {
    return new Asking(() -> false, Optional.of(new Work(Calls.COUNTER, most)));
  }

  /** Says stop once {@code stop} does. */
  static Deadline until(BooleanSupplier stop) {
    return new Asking(stop, Optional.empty());
  }

  /** A deadline without a clock: an hour is always left. */
  private record Asking(BooleanSupplier stop, Optional<Work> work) implements Deadline {
    @Override
    public long nanosLeft() {
      return 3_600_000_000_000L;
    }

    @Override
    public boolean stopAsked() {
      return stop.getAsBoolean();
    }

    @Override
    public void onStop(Runnable wake) {
      throw new AssertionError("nobody here waits to be woken");
    }
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
  public void blame(String measure, Longs byPosting) {}
}
