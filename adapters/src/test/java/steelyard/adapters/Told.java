package steelyard.adapters;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Timer;
import java.util.TimerTask;
import steelyard.adapters.spi.Backend;
import steelyard.adapters.spi.Deadline;
import steelyard.adapters.spi.Goal;
import steelyard.adapters.spi.Lowered;
import steelyard.adapters.spi.Lowering;
import steelyard.adapters.spi.Monitor;
import steelyard.adapters.spi.Programs;
import steelyard.adapters.spi.Refusal;
import steelyard.adapters.spi.Seeding;
import steelyard.adapters.spi.Setting;
import steelyard.adapters.spi.Settings;
import steelyard.adapters.spi.SolveOutcome;
import steelyard.adapters.spi.SolveRequest;
import steelyard.adapters.spi.TestPrograms;
import steelyard.adapters.spi.Work;
import steelyard.variants.model.Longs;
import steelyard.variants.model.Model;
import steelyard.variants.model.judge.Evaluator;
import steelyard.variants.model.judge.Evaluator.Judgement;

/**
 * What a backend says of a model, in the model's own terms, each solution judged.
 *
 * @param outcome how the solve ended
 * @param solutions as judged on the model, in the order in which they came
 * @param bounds in the order in which they came
 */
record Told(SolveOutcome outcome, List<Judgement> solutions, List<Long> bounds) {
  private static final long WAKE_EVERY = 50; // milliseconds, as Deadline promises

  Told {
    solutions = List.copyOf(solutions);
    bounds = List.copyOf(bounds);
  }

  /**
   * Asks the backend at its default settings, one thread, within the wall limit. Of a backend that
   * starts a program it is assumed that the program is there.
   */
  static Told by(Backend backend, Model model, Goal goal, long seed, long seconds) {
    try (TestPrograms programs = TestPrograms.inTemporaryFolder()) {
      Settings settings = Settings.of(backend.describe(), Map.of());
      assumeUsable(backend, settings, programs);
      Wall wall = new Wall(seconds);
      SolveRequest request = new SolveRequest(settings, seed, 1, wall, programs);
      return by(backend, model, goal, request, wall);
    }
  }

  private static void assumeUsable(Backend backend, Settings settings, Programs programs) {
    boolean startsProgram =
        backend.describe().settings().stream().anyMatch(s -> s.kind() == Setting.Kind.COMMAND);
    if (startsProgram && backend.probe(settings, programs) instanceof Refusal refusal) {
      assumeTrue(false, refusal.reason());
    }
  }

  private static Told by(Backend backend, Model model, Goal goal, SolveRequest request, Wall wall) {
    Seeding seeding = Seeding.of(model, request.seed());
    Ear ear = new Ear(model);
    Monitor monitor = seeding.monitor(ear);
    Lowered lowered = backend.lower(seeding.model(), request, monitor);
    assertThat(lowered).isNotInstanceOf(Refusal.class);
    Timer timer = new Timer("wall limit", true);
    try (Lowering lowering = (Lowering) lowered) {
      timer.schedule(wall.waking(), WAKE_EVERY, WAKE_EVERY);
      SolveOutcome outcome = lowering.solve(seeding.goal(goal), monitor);
      return new Told(outcome, ear.solutions, ear.bounds);
    } finally {
      timer.cancel();
    }
  }

  /** The last solution's objective. */
  OptionalLong objective() {
    return solutions.isEmpty()
        ? OptionalLong.empty()
        : solutions.get(solutions.size() - 1).objective();
  }

  private static final class Ear implements Monitor {
    private final Evaluator evaluator;
    private final List<Judgement> solutions = new ArrayList<>();
    private final List<Long> bounds = new ArrayList<>();

    Ear(Model model) {
      evaluator = new Evaluator(model);
    }

    @Override
    public void phase(String name) {}

    @Override
    public void solution(int[] decisions) {
      solutions.add(evaluator.judge(decisions.clone()));
    }

    @Override
    public void bound(long value) {
      bounds.add(value);
    }

    @Override
    public void count(String counter, long value) {}

    @Override
    public void blame(String measure, Longs byPosting) {}
  }

  /** A wall limit; wakes a blocking solver when it has passed. */
  private static final class Wall implements Deadline {
    private final long end;
    private volatile Runnable wake = () -> {};

    Wall(long seconds) {
      end = System.nanoTime() + seconds * 1_000_000_000;
    }

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
    public void onStop(Runnable wake) {
      this.wake = wake;
    }

    TimerTask waking() {
      return new TimerTask() {
        @Override
        public void run() {
          if (stopAsked()) {
            wake.run();
          }
        }
      };
    }
  }
}
