package steelyard.harness.process;

import java.io.IOException;
import java.lang.ProcessBuilder.Redirect;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.function.Predicate;

/**
 * The system's programs that starting and ending processes can make use of, and what holds without
 * them.
 *
 * @param setsid gives a child a session of its own; without it its processes are told by their tag
 *     and their parents alone
 * @param taskset pins a child to cores; without it children run where the kernel puts them
 * @param kill ends a whole group in one step; without it processes are ended one by one, again
 *     until none is left
 */
public record Tools(Optional<Path> setsid, Optional<Path> taskset, Optional<Path> kill) {

  /** What the search path of this process and the usual folders offer. */
  public static Tools detect() {
    return new Tools(find("setsid"), find("taskset"), find("kill"));
  }

  /** Nothing but the JDK; also right for a child that starts programs within its own session. */
  public static Tools none() {
    return new Tools(Optional.empty(), Optional.empty(), Optional.empty());
  }

  /** One line for each property of a run that depends on a tool: what is in force here. */
  public List<String> inForce() {
    return List.of(
        line("session of its own", setsid, "no: setsid not found, processes told by tag"),
        line("pinned to cores", taskset, "no: taskset not found"),
        line("killed as a group", kill, "no: kill not found, ended one by one"));
  }

  private static String line(String what, Optional<Path> tool, String without) {
    return what + ": " + tool.map(path -> "yes (" + path + ")").orElse(without);
  }

  /** An executable file: the path itself, or a name looked for in the search path. */
  static Optional<Path> find(String program) {
    Predicate<Path> executable = path -> Files.isRegularFile(path) && Files.isExecutable(path);
    if (program.indexOf('/') >= 0) {
      return Optional.of(Path.of(program).toAbsolutePath()).filter(executable);
    }
    return searchPath().stream()
        .map(folder -> folder.resolve(program).toAbsolutePath())
        .filter(executable)
        .findFirst();
  }

  private static List<Path> searchPath() {
    List<Path> folders = new ArrayList<>();
    String path = Optional.ofNullable(System.getenv("PATH")).orElse("");
    Arrays.stream(path.split(":", -1))
        .filter(f -> !f.isEmpty())
        .map(Path::of)
        .forEach(folders::add);
    List.of("/usr/bin", "/bin", "/usr/sbin", "/sbin").forEach(f -> folders.add(Path.of(f)));
    return folders;
  }

  /** Sends SIGKILL to process groups, if the tool is there; failure is seen by looking again. */
  void killGroups(Collection<Long> groups) {
    if (kill.isEmpty() || groups.isEmpty()) {
      return;
    }
    List<String> command = new ArrayList<>(List.of(kill.get().toString(), "-KILL", "--"));
    groups.forEach(group -> command.add("-" + group));
    try {
      new ProcessBuilder(command)
          .redirectOutput(Redirect.DISCARD)
          .redirectError(Redirect.DISCARD)
          .start()
          .waitFor(1, TimeUnit.SECONDS);
    } catch (IOException e) {
      return;
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    }
  }
}
