package steelyard.harness.launch;

import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import steelyard.harness.sweep.Builds;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.worker.Event;

/**
 * Has a worker try out each program that options name, once; its file becomes part of what a run's
 * code is.
 */
public final class ProgramBuilds implements Builds {
  private static final Duration WITHIN = Duration.ofSeconds(30);
  private static final long MEMORY_BYTES = 1L << 30;
  private static final double HEAP_SHARE = 0.25;

  private final Crew crew;
  private final Map<List<String>, WorkerEnd> ends = new HashMap<>();

  public ProgramBuilds(Crew crew) {
    this.crew = crew;
  }

  @Override
  public Build of(Catalogue.Backend backend, SortedMap<String, String> options) {
    if (!Builds.startsProgram(backend)) {
      return DESCRIBED.of(backend, options);
    }
    List<String> arguments = new ArrayList<>(List.of("probe", backend.name()));
    options.forEach((name, value) -> arguments.add(name + "=" + value));
    Event.Program program = tried(ends.computeIfAbsent(arguments, this::tryOut));
    return new Build(program.version(), CodeDigests.with(backend.code(), Path.of(program.file())));
  }

  private WorkerEnd tryOut(List<String> arguments) {
    return Errands.once(
        crew,
        folder ->
            new WorkerTask(
                arguments.get(0),
                arguments,
                folder,
                crew.installation().classPath(arguments.get(1), Optional.empty()),
                "",
                HEAP_SHARE,
                1,
                List.of(),
                Crew.service(WITHIN, MEMORY_BYTES)));
  }

  private static Event.Program tried(WorkerEnd end) {
    return end.last(Event.Program.class)
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    end.last(Event.Failure.class)
                        .map(Event.Failure::message)
                        .orElseGet(() -> "the program could not be tried: " + end.howItEnded())));
  }
}
