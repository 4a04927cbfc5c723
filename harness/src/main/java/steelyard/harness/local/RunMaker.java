package steelyard.harness.local;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Clock;
import java.time.Duration;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Consumer;
import steelyard.adapters.spi.Work;
import steelyard.harness.launch.Crew;
import steelyard.harness.launch.HarnessProblem;
import steelyard.harness.launch.ModelFactsFinder;
import steelyard.harness.launch.Subjects;
import steelyard.harness.launch.WorkerEnd;
import steelyard.harness.launch.WorkerTask;
import steelyard.harness.process.ProcessLimits;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.RunOrder;
import steelyard.harness.worker.StampedEvent;
import steelyard.harness.worker.Wire;
import steelyard.results.ledger.Exit;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.ModelFacts;
import steelyard.results.ledger.PeakMemory;
import steelyard.results.ledger.RunRecord;
import steelyard.results.ledger.RunRecords;
import steelyard.results.ledger.Session;

/** Makes one run in a process of its own, and its record. */
public final class RunMaker {
  /** Start and load of a worker may take this long, wherever the limit of the run lies. */
  private static final Duration START = Duration.ofSeconds(30);

  private final Crew crew;
  private final Session session;
  private final Clock clock;

  public RunMaker(Crew crew, Session session, Clock clock) {
    this.crew = crew;
    this.session = session;
    this.clock = clock;
  }

  /**
   * Makes the run in its folder; when this returns its record lies there, on disk.
   *
   * @param cores the logical processors that it holds
   * @param heard told each event as it comes in
   */
  public RunRecord make(
      RunPlan plan, Path folder, List<Integer> cores, Consumer<StampedEvent> heard) {
    try {
      Files.createDirectories(folder);
      Wire.write(order(plan), folder.resolve(Wire.ORDER));
      WorkerEnd end = crew.perform(task(plan, folder, cores, List.of("run")), heard);
      RunRecord record = record(plan, end);
      RunRecords.write(folder, record);
      return record;
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write to " + folder, e);
    }
  }

  /**
   * Lowers without solving.
   *
   * @param format an open format to write in; empty for none
   * @param target the file to write; empty for none
   */
  public WorkerEnd lower(RunPlan plan, Path folder, String format, String target) {
    try {
      Files.createDirectories(folder);
      Wire.write(order(plan), folder.resolve(Wire.ORDER));
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write to " + folder, e);
    }
    return crew.perform(
        task(plan, folder, List.of(), List.of("lower", format, target)), event -> {});
  }

  private static RunOrder order(RunPlan plan) {
    Limits limits = plan.setup().limits();
    return new RunOrder(
        Subjects.of(plan.recipe()),
        plan.setup().backend().adapter(),
        plan.setup().setting().options(),
        plan.seed(),
        plan.setup().threads(),
        Optional.of(RunOrder.GoalKind.valueOf(plan.goal().kind().name())),
        plan.goal().atMost().orElse(1),
        limits.wallSeconds(),
        limits.work().map(work -> new Work(work.unit(), work.amount())));
  }

  private WorkerTask task(RunPlan plan, Path folder, List<Integer> cores, List<String> arguments) {
    return new WorkerTask(
        plan.run(),
        arguments,
        folder,
        crew.installation().classPath(plan.setup().backend().adapter(), plan.recipe().alias()),
        plan.setup().backend().adapter(),
        plan.heapShare(),
        plan.setup().threads(),
        cores,
        limits(plan.setup().limits(), plan.build()));
  }

  private static ProcessLimits limits(Limits limits, Duration build) {
    SortedMap<String, Duration> allowances =
        new TreeMap<>(
            Map.of(
                ProcessLimits.START, START,
                Phases.LOAD, START,
                Phases.BUILD, build,
                Phases.SHUFFLE, build));
    return new ProcessLimits(
        Duration.ofNanos((long) (limits.wallSeconds() * 1e9)),
        Set.copyOf(Phases.LIMITED),
        ProcessLimits.DEFAULT_GRACE,
        allowances,
        START,
        limits.memoryBytes(),
        ProcessLimits.DEFAULT_OUTPUT_BYTES);
  }

  private RunRecord record(RunPlan plan, WorkerEnd end) {
    double wallSeconds = plan.setup().limits().wallSeconds();
    RunReading reading = new RunReading(end);
    Optional<ModelFacts> model =
        end.last(Event.Built.class)
            .map(
                built ->
                    ModelFactsFinder.facts(
                        built.facts(),
                        plan.plainCanonical()
                            .orElse(ModelFactsFinder.digest(built.facts().canonical()))));
    OptionalLong peak =
        end.exit().usage().peakBytes() > 0
            ? OptionalLong.of(end.exit().usage().peakBytes())
            : OptionalLong.empty();
    return new RunRecord(
        plan.run(),
        plan.key(),
        plan.attempt(),
        plan.place(),
        plan.recipe(),
        model,
        plan.setup().backend(),
        plan.setup().setting(),
        plan.conditions(),
        session,
        reading.times(),
        Outcomes.of(end, reading, wallSeconds),
        new PeakMemory(peak.orElse(0), end.exit().usage().peakSource().name()),
        reading.counters(),
        reading.sizes(),
        reading.trace((long) (wallSeconds * 1e9)),
        new Exit(end.exit().code(), end.exit().stderr()),
        end.exit().usage().disturbed(),
        clock.instant());
  }
}
