package steelyard.harness.process;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/**
 * A command that runs a main class in a JVM whose behaviour does not depend on the machine it
 * finds: fixed heap, serial collector, as many processors as it is given, all its files in one
 * folder.
 *
 * @param classPath what it loads classes from
 * @param mainClass the class to run
 * @param arguments handed to it
 * @param folder of the run: for temporary files and crash reports
 * @param heapBytes the heap, at its start and at most
 * @param threads how many processors the JVM believes to have
 * @param natives where native libraries lie unpacked
 * @param archive of classes, made for a beginning of the class path
 */
public record JavaCommand(
    ClassPath classPath,
    String mainClass,
    List<String> arguments,
    Path folder,
    long heapBytes,
    int threads,
    Optional<Path> natives,
    Optional<Path> archive) {

  /** Variables that change the behaviour of any JVM; a worker does not get them. */
  public static final Set<String> WITHHELD =
      Set.of("JAVA_TOOL_OPTIONS", "JDK_JAVA_OPTIONS", "_JAVA_OPTIONS", "CLASSPATH");

  /**
   * Exit code when the heap is exhausted: what {@code -XX:+ExitOnOutOfMemoryError} ends with in the
   * JDKs from 17 to 25 (seen, not documented).
   */
  public static final int HEAP_EXHAUSTED = 3;

  private static final long MEBIBYTE = 1L << 20;
  private static final long LEAST_HEAP = 32 * MEBIBYTE;

  /**
   * From here on, native code and unsafe memory access cause warnings if not allowed (JEP 472, JEP
   * 498).
   */
  private static final int WARNS_OF_NATIVE_CODE = 24;

  public JavaCommand {
    arguments = List.copyOf(arguments);
    folder = folder.toAbsolutePath();
    natives = natives.map(Path::toAbsolutePath);
    archive = archive.map(Path::toAbsolutePath);
    if (heapBytes < LEAST_HEAP) {
      throw new IllegalArgumentException(
          "a heap of " + heapBytes + " bytes is below the least, " + LEAST_HEAP);
    }
    if (threads < 1) {
      throw new IllegalArgumentException("threads: " + threads + " is not positive");
    }
  }

  /**
   * The heap for a share of a memory limit, in whole mebibytes, at least 32.
   *
   * @param memoryBytes limit on all that the process holds
   * @param share in (0, 1]: what the heap may take of it
   */
  public static long heapBytes(long memoryBytes, double share) {
    if (!(share > 0 && share <= 1)) {
      throw new IllegalArgumentException("heap share " + share + " is not in (0, 1]");
    }
    return Math.max(LEAST_HEAP, (long) (memoryBytes * share) / MEBIBYTE * MEBIBYTE);
  }

  /** The JVM that this process runs in. */
  public static Path java() {
    return Path.of(System.getProperty("java.home"), "bin", "java");
  }

  public Path temporaryFolder() {
    return folder.resolve("tmp");
  }

  /** Where the JVM reports a crash in native code. */
  public Path crashReport() {
    return folder.resolve("hs_err.log");
  }

  /** The same command with an archive of classes. */
  public JavaCommand with(Path classes) {
    return new JavaCommand(
        classPath, mainClass, arguments, folder, heapBytes, threads, natives, Optional.of(classes));
  }

  /** Makes the folders that the command needs. */
  public void makeFolders() throws IOException {
    Files.createDirectories(temporaryFolder());
  }

  /** The command, word by word. */
  public List<String> line() {
    List<String> line = new ArrayList<>();
    line.add(java().toString());
    line.addAll(options());
    line.addAll(List.of("-cp", classPath.joined(), mainClass));
    line.addAll(arguments);
    return line;
  }

  private List<String> options() {
    List<String> options = new ArrayList<>();
    options.add("-Xms" + heapBytes);
    options.add("-Xmx" + heapBytes);
    options.add("-Xss16m");
    options.add("-XX:+UseSerialGC");
    options.add("-XX:ActiveProcessorCount=" + threads);
    options.add("-XX:+ExitOnOutOfMemoryError");
    options.add("-XX:-CreateCoredumpOnCrash");
    options.add("-XX:-UsePerfData"); // its file outlives a killed JVM
    options.add("-XX:ErrorFile=" + crashReport());
    options.add("-Djava.io.tmpdir=" + temporaryFolder());
    options.add("-Dfile.encoding=UTF-8");
    if (Runtime.version().feature() >= WARNS_OF_NATIVE_CODE) {
      options.add("--enable-native-access=ALL-UNNAMED");
      options.add("--sun-misc-unsafe-memory-access=allow");
    }
    natives.ifPresent(path -> options.add("-Djava.library.path=" + path));
    archive.ifPresent(path -> options.add("-XX:SharedArchiveFile=" + path));
    return options;
  }
}
