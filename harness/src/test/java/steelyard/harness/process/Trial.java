package steelyard.harness.process;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.UUID;

/** One child in a folder with a space in its name, under limits that suit a test. */
final class Trial {
  static final long MEBIBYTE = 1L << 20;

  final Path folder;
  final String tag = UUID.randomUUID().toString();
  final StopSwitch stop = new StopSwitch();
  Tools tools = Tools.detect();
  Duration wall = Duration.ofSeconds(20);
  Duration grace = Duration.ofSeconds(10);
  long memoryBytes = 4096 * MEBIBYTE;
  long outputBytes = ProcessLimits.DEFAULT_OUTPUT_BYTES;
  final SortedMap<String, Duration> allowances = new TreeMap<>();
  Set<String> mainPhases = Set.of(ProcessLimits.START);
  PhaseSource phases = PhaseSource.none();

  Trial(Path temporary) {
    folder = temporary.resolve("a folder");
    try {
      Files.createDirectories(folder);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  Exit shell(String script, String... arguments) throws IOException {
    return watch(start(script, arguments)).await();
  }

  RunningProcess start(String script, String... arguments) throws IOException {
    List<String> command = new ArrayList<>(List.of("sh", "-c", script, "sh"));
    command.addAll(List.of(arguments));
    return Launcher.unnoted(tools).start(Launch.of("trial", tag, command, folder));
  }

  Watch watch(RunningProcess child) {
    ProcessLimits limits =
        new ProcessLimits(
            wall, mainPhases, grace, allowances, Duration.ofSeconds(20), memoryBytes, outputBytes);
    return new Watch(child, limits, phases, stop);
  }

  /** Lets the child be in a phase from the first look on. */
  void mark(String phase) {
    List<PhaseMark> marks = new ArrayList<>(List.of(new PhaseMark(phase, System.nanoTime())));
    phases =
        () -> {
          List<PhaseMark> fresh = List.copyOf(marks);
          marks.clear();
          return fresh;
        };
  }

  String stdout() throws IOException {
    return Files.readString(folder.resolve("stdout"));
  }

  /** Living processes that carry the tag of this trial, found without the code under test. */
  List<ProcessHandle> survivors() {
    return ProcessHandle.allProcesses().filter(this::carriesTag).toList();
  }

  private boolean carriesTag(ProcessHandle process) {
    Path files = Path.of("/proc", Long.toString(process.pid()));
    try {
      return Files.readString(files.resolve("environ"), StandardCharsets.ISO_8859_1)
              .contains("STEELYARD_RUN=" + tag)
          && !Files.readString(files.resolve("stat"), StandardCharsets.ISO_8859_1).contains(") Z ");
    } catch (IOException e) {
      return false;
    }
  }
}
