package steelyard.harness.launch;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.UUID;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.Consumer;
import steelyard.harness.process.CacheFolder;
import steelyard.harness.process.ClassArchive;
import steelyard.harness.process.ClassPath;
import steelyard.harness.process.Exit;
import steelyard.harness.process.JavaCommand;
import steelyard.harness.process.Launch;
import steelyard.harness.process.Launcher;
import steelyard.harness.process.NativeCache;
import steelyard.harness.process.PhaseMark;
import steelyard.harness.process.ProcessLimits;
import steelyard.harness.process.RunningProcess;
import steelyard.harness.process.StopSwitch;
import steelyard.harness.process.Watch;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.EventTail;
import steelyard.harness.worker.Phases;
import steelyard.harness.worker.StampedEvent;
import steelyard.harness.worker.Wire;
import steelyard.harness.worker.Worker;

/** Starts workers and waits for them. Safe for use by several threads. */
public final class Crew {
  /** The main class of a worker; named here once. */
  private static final String MAIN = Worker.class.getName();

  /** The jar whose folder of the same name holds native libraries, by backend. */
  private static final Map<String, String> NATIVE_JARS = Map.of("cpsat", "ortools-linux-");

  private static final long ARCHIVE_HEAP_BYTES = 256L << 20;

  private final Installation installation;
  private final Launcher launcher;
  private final CacheFolder cache;
  private final StopSwitch stop;
  private final Map<ClassPath, Optional<Path>> archives = new ConcurrentHashMap<>();
  private final Map<String, Optional<Path>> natives = new ConcurrentHashMap<>();

  public Crew(Installation installation, Launcher launcher, CacheFolder cache, StopSwitch stop) {
    this.installation = installation;
    this.launcher = launcher;
    this.cache = cache;
    this.stop = stop;
  }

  public Installation installation() {
    return installation;
  }

  public CacheFolder cache() {
    return cache;
  }

  public StopSwitch stop() {
    return stop;
  }

  /** Limits of a worker that solves nothing. */
  public static ProcessLimits service(Duration wall, long memoryBytes) {
    return ProcessLimits.plain(wall, memoryBytes);
  }

  /**
   * Starts a worker and waits for its end.
   *
   * @param heard told each event as it comes in, about twenty times a second
   * @throws HarnessProblem if it cannot be started
   */
  public WorkerEnd perform(WorkerTask task, Consumer<StampedEvent> heard) {
    RunningProcess child = start(task);
    Tail tail = new Tail(task, heard);
    Exit exit = new Watch(child, task.limits(), tail::newMarks, stop).await();
    tail.newMarks();
    return new WorkerEnd(child.startNanos(), exit, tail.events, tail.tail.forged());
  }

  /**
   * Starts a worker that serves; whoever calls this ends it.
   *
   * @throws HarnessProblem if it cannot be started
   */
  public RunningProcess start(WorkerTask task) {
    try {
      Files.createDirectories(task.folder());
      JavaCommand command = command(task);
      command.makeFolders();
      String tag = UUID.randomUUID().toString();
      return launcher.start(
          Launch.of(task.name(), tag, command.line(), task.folder())
              .withhold(JavaCommand.WITHHELD)
              .on(task.cores()));
    } catch (IOException e) {
      throw HarnessProblem.of("cannot start a worker", e);
    }
  }

  private JavaCommand command(WorkerTask task) throws IOException {
    long heap = JavaCommand.heapBytes(task.limits().memoryBytes(), task.heapShare());
    JavaCommand command =
        new JavaCommand(
            task.classPath(),
            MAIN,
            task.arguments(),
            task.folder(),
            heap,
            task.threads(),
            natives(task.backend()),
            Optional.empty());
    return archive(task.classPath().withoutFamily()).map(command::with).orElse(command);
  }

  /** The archive of classes, made at first use; a worker that has none starts without. */
  private Optional<Path> archive(ClassPath classPath) {
    if (!installation.isPacked()) {
      return Optional.empty();
    }
    synchronized (archives) {
      return archives.computeIfAbsent(classPath, this::makeArchive);
    }
  }

  private Optional<Path> makeArchive(ClassPath classPath) {
    try {
      Path folder = Files.createTempDirectory("steelyard-archive");
      try {
        JavaCommand training =
            new JavaCommand(
                classPath,
                MAIN,
                List.of("train"),
                folder,
                ARCHIVE_HEAP_BYTES,
                1,
                Optional.empty(),
                Optional.empty());
        return Optional.of(new ClassArchive(cache, launcher).of(training, stop));
      } finally {
        Folders.delete(folder);
      }
    } catch (IOException e) {
      return Optional.empty();
    }
  }

  private Optional<Path> natives(String backend) {
    return Optional.ofNullable(NATIVE_JARS.get(backend))
        .flatMap(start -> natives.computeIfAbsent(backend, b -> unpacked(start)));
  }

  private Optional<Path> unpacked(String start) {
    String architecture = System.getProperty("os.arch").equals("aarch64") ? "aarch64" : "x86-64";
    Optional<Path> jar = installation.jar(start + architecture);
    try {
      return jar.isEmpty()
          ? Optional.empty()
          : Optional.of(new NativeCache(cache).unpacked(jar.get(), start + architecture));
    } catch (IOException e) {
      throw HarnessProblem.of("cannot unpack native libraries", e);
    }
  }

  /** How workers are launched, for the record. */
  public SortedMap<String, String> profile() {
    SortedMap<String, String> profile = new TreeMap<>();
    profile.put("jdk", System.getProperty("java.vm.version"));
    profile.put("collector", "serial");
    profile.put("archive", Boolean.toString(installation.isPacked()));
    return profile;
  }

  /** Follows the events of one worker. */
  private static final class Tail {
    private final EventTail tail;
    private final Set<String> phases;
    private final Consumer<StampedEvent> heard;
    private final List<StampedEvent> events = new ArrayList<>();

    Tail(WorkerTask task, Consumer<StampedEvent> heard) {
      this.tail = new EventTail(task.folder().resolve(Wire.EVENTS));
      this.phases = new HashSet<>(Phases.ALL);
      this.phases.addAll(task.limits().allowances().keySet());
      this.heard = heard;
    }

    List<PhaseMark> newMarks() {
      List<PhaseMark> marks = new ArrayList<>();
      try {
        for (StampedEvent stamped : tail.next()) {
          events.add(stamped);
          heard.accept(stamped);
          if (stamped.event() instanceof Event.Phase phase && phases.contains(phase.name())) {
            marks.add(new PhaseMark(phase.name(), stamped.nanos()));
          }
        }
      } catch (IOException e) {
        throw new UncheckedIOException("cannot read a worker's events: " + e.getMessage(), e);
      }
      return marks;
    }
  }
}
