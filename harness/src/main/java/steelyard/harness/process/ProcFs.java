package steelyard.harness.process;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.DirectoryIteratorException;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;

/**
 * Reads the kernel's process file system. A process may end between any two reads, so that what
 * cannot be read is absent, never an error.
 *
 * <p>Source: proc(5) and its parts, Linux man-pages 6.9.
 */
final class ProcFs {
  static final ProcFs SYSTEM = new ProcFs(Path.of("/proc"));

  /**
   * Clock ticks per second, as the kernel shows them to programs: 100 on every architecture that a
   * JDK runs on (sysconf(3), {@code _SC_CLK_TCK}).
   */
  static final long TICKS_PER_SECOND = 100;

  static final long NANOS_PER_TICK = 1_000_000_000L / TICKS_PER_SECOND;

  private final Path root;

  ProcFs(Path root) {
    this.root = root;
  }

  /** Whether processes can be watched here at all. */
  boolean available() {
    return Files.isReadable(root.resolve("self").resolve("stat"));
  }

  /** All processes that can be seen, ascending. */
  List<Long> pids() {
    List<Long> pids = new ArrayList<>();
    try (DirectoryStream<Path> entries = Files.newDirectoryStream(root, ProcFs::isNamedByDigits)) {
      entries.forEach(entry -> pids.add(Long.parseLong(entry.getFileName().toString())));
    } catch (IOException | DirectoryIteratorException e) {
      return List.of();
    }
    Collections.sort(pids);
    return pids;
  }

  private static boolean isNamedByDigits(Path entry) {
    char first = entry.getFileName().toString().charAt(0);
    return first >= '0' && first <= '9';
  }

  Optional<ProcStat> stat(long pid) {
    return read(file(pid, "stat")).flatMap(ProcStat::parse);
  }

  /** The same process still runs: same pid, same start, no zombie. */
  boolean alive(ProcessId id) {
    return stat(id.pid()).filter(s -> s.alive() && s.id().equals(id)).isPresent();
  }

  /** Resident memory of a process; zero once it has ended. */
  Memory memory(long pid) {
    String status = read(file(pid, "status")).orElse("");
    return new Memory(kibibytes(status, "VmRSS:"), kibibytes(status, "VmHWM:"));
  }

  /** Bytes resident now, and the most that ever were since the program was loaded. */
  record Memory(long residentBytes, long peakBytes) {}

  /**
   * The environment that a program was started with, as in the file; empty if it cannot be read.
   */
  String environment(long pid) {
    return read(file(pid, "environ")).orElse("");
  }

  /** The words that a program was started with, as in the file; empty if they cannot be read. */
  String commandLine(long pid) {
    return read(file(pid, "cmdline")).orElse("");
  }

  /** The value of a variable in an environment. */
  static Optional<String> variable(String environment, String name) {
    String marker = "\0" + name + "=";
    String marked = "\0" + environment;
    int at = marked.indexOf(marker);
    if (at < 0) {
      return Optional.empty();
    }
    int from = at + marker.length();
    int end = marked.indexOf('\0', from);
    return Optional.of(marked.substring(from, end < 0 ? marked.length() : end));
  }

  /** Clock ticks since boot, time asleep included. */
  OptionalLong uptimeTicks() {
    return read(root.resolve("uptime"))
        .map(text -> Double.parseDouble(text.substring(0, text.indexOf(' '))))
        .map(seconds -> OptionalLong.of(Math.round(seconds * TICKS_PER_SECOND)))
        .orElse(OptionalLong.empty());
  }

  /** Changes with every boot; empty where the kernel does not say. */
  String bootId() {
    return kernelFact("random/boot_id");
  }

  String hostName() {
    return kernelFact("hostname");
  }

  private String kernelFact(String name) {
    return read(root.resolve("sys").resolve("kernel").resolve(name)).map(String::strip).orElse("");
  }

  /** A file of the process file system by its path below the root. */
  Optional<String> text(String path) {
    return read(root.resolve(path));
  }

  private Path file(long pid, String name) {
    return root.resolve(Long.toString(pid)).resolve(name);
  }

  private static long kibibytes(String status, String key) {
    int at = status.indexOf(key);
    if (at < 0) {
      return 0;
    }
    int end = status.indexOf(" kB", at);
    return 1024 * Long.parseLong(status.substring(at + key.length(), end).strip());
  }

  /** Latin-1, so that any byte in a name or an environment is read. */
  private static Optional<String> read(Path file) {
    try (InputStream in = Files.newInputStream(file)) {
      return Optional.of(new String(in.readAllBytes(), StandardCharsets.ISO_8859_1));
    } catch (IOException e) {
      return Optional.empty();
    }
  }
}
