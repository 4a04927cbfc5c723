package steelyard.harness.process;

import java.io.IOException;
import java.lang.ProcessBuilder.Redirect;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.stream.Collectors;

/**
 * Starts children: in a session of their own, pinned, tagged, with their lifeline.
 *
 * <p>Standard input of a child is a pipe that this process holds. A line {@code stop} on it asks
 * the child to end; its end says that the harness is gone, and the child ends itself.
 *
 * <p>Safe for use by several threads.
 */
public final class Launcher {
  /** A process started just before is taken for one of ours rather than missed. */
  private static final long START_SLACK_TICKS = 2;

  private final Tools tools;
  private final Optional<LiveTable> live;
  private final ProcFs proc = ProcFs.SYSTEM;
  private final Set<RunningProcess> running = ConcurrentHashMap.newKeySet();

  private Launcher(Tools tools, Optional<LiveTable> live) {
    this.tools = tools;
    this.live = live;
  }

  /** Notes every child in the table while it runs, so that none is lost with this process. */
  public static Launcher noting(LiveTable live, Tools tools) {
    return new Launcher(tools, Optional.of(live));
  }

  /** For a process that is itself watched, or whose children end with their lifeline. */
  public static Launcher unnoted(Tools tools) {
    return new Launcher(tools, Optional.empty());
  }

  /**
   * Starts a child. Whoever calls this goes on to {@link Watch} it.
   *
   * @throws IOException if the program or the folder is not there, or the system refuses; one clear
   *     sentence
   */
  public RunningProcess start(Launch launch) throws IOException {
    if (!proc.available()) {
      throw new IOException("cannot watch processes here: /proc is not readable");
    }
    if (!Files.isDirectory(launch.folder())) {
      throw new IOException("working folder " + launch.folder() + " does not exist");
    }
    String tag = fullTag(launch);
    ProcessBuilder builder =
        new ProcessBuilder(commandLine(launch)).directory(launch.folder().toFile());
    builder.environment().keySet().removeAll(launch.withheld());
    builder.environment().putAll(launch.environment());
    builder.environment().put(Kin.TAG_VARIABLE, tag);
    builder.redirectOutput(emptied(launch.stdout())).redirectError(emptied(launch.stderr()));
    return start(launch, tag, builder);
  }

  private RunningProcess start(Launch launch, String tag, ProcessBuilder builder)
      throws IOException {
    long earliestTicks = Math.max(0, proc.uptimeTicks().orElse(0) - START_SLACK_TICKS);
    Optional<LiveTable.Entry> entry = Optional.empty();
    if (live.isPresent()) {
      entry = Optional.of(live.get().enter(launch.run(), tag, earliestTicks));
    }
    long startNanos = System.nanoTime();
    Process process;
    try {
      process = builder.start();
    } catch (IOException e) {
      entry.ifPresent(LiveTable.Entry::leave);
      throw new IOException("cannot start " + launch.command().get(0) + ": " + e.getMessage(), e);
    }
    RunningProcess child =
        new RunningProcess(process, launch, tag, startNanos, earliestTicks, this, entry);
    running.add(child);
    entry.ifPresent(e -> e.started(process.pid()));
    return child;
  }

  private List<String> commandLine(Launch launch) throws IOException {
    String name = launch.command().get(0);
    Path program =
        Tools.find(name)
            .orElseThrow(
                () -> new IOException("program '" + name + "' not found or not executable"));
    List<String> line = new ArrayList<>();
    tools.setsid().ifPresent(tool -> line.add(tool.toString()));
    if (tools.taskset().isPresent() && !launch.cores().isEmpty()) {
      String list = launch.cores().stream().map(String::valueOf).collect(Collectors.joining(","));
      line.addAll(List.of(tools.taskset().get().toString(), "-c", list));
    }
    line.add(program.toString());
    line.addAll(launch.command().subList(1, launch.command().size()));
    return line;
  }

  /** A run within a run carries the outer tag in front, so that the outer one still finds it. */
  private static String fullTag(Launch launch) {
    return Optional.ofNullable(System.getenv(Kin.TAG_VARIABLE))
        .map(outer -> outer + Launch.TAG_SEPARATOR + launch.tag())
        .orElse(launch.tag());
  }

  /** Opened for appending, so that a file cut while it is written goes on from its new end. */
  private static Redirect emptied(Path file) throws IOException {
    Files.deleteIfExists(file);
    return Redirect.appendTo(file.toFile());
  }

  Tools tools() {
    return tools;
  }

  void forget(RunningProcess child) {
    running.remove(child);
  }

  /** Kills all children of this launcher at once and waits, within a bound, until they are gone. */
  public void endAll() {
    running.forEach(RunningProcess::end);
  }

  /** How many children run. */
  public int running() {
    return running.size();
  }
}
