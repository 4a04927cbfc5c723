package steelyard.harness.process;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Real JVMs, with spaces in every path. */
class JavaCommandTests {
  private static final long HEAP = 64 * Trial.MEBIBYTE;
  private static final String LOADED = "classes.log";

  @TempDir Path temporary;
  private Trial trial;
  private ClassPath classPath;

  @BeforeEach
  void makeJars() throws IOException {
    trial = new Trial(temporary);
    Path core = TestJars.withClass(temporary.resolve("core jars/core.jar"), ReportProgram.class);
    Path family = TestJars.withClass(temporary.resolve("family.jar"), Eventually.class);
    classPath = new ClassPath(List.of(core), List.of(), List.of(family));
  }

  private JavaCommand command(ClassPath path, String... arguments) {
    return new JavaCommand(
        path,
        ReportProgram.class.getName(),
        List.of(arguments),
        trial.folder,
        HEAP,
        1,
        Optional.empty(),
        Optional.empty());
  }

  private Exit run(List<String> line) throws IOException {
    Launch launch = Launch.of("java", trial.tag, line, trial.folder).withhold(JavaCommand.WITHHELD);
    return trial.watch(Launcher.unnoted(Tools.detect()).start(launch)).await();
  }

  @Test
  void runs_class_withTheHeapAndFoldersGiven() throws IOException {
    JavaCommand command = command(classPath, "two words");
    command.makeFolders();
    Exit exit = run(command.line());

    assertThat(exit.stderr()).isEmpty();
    assertThat(exit.clean()).isTrue();
    assertThat(command.temporaryFolder()).isEmptyDirectory();
    assertThat(trial.stdout().lines())
        .contains(
            "java.io.tmpdir=" + trial.folder.resolve("tmp"),
            "file.encoding=UTF-8",
            "processors=1",
            "argument=two words",
            "java.class.path="
                + temporary.resolve("core jars/core.jar")
                + ":"
                + temporary.resolve("family.jar"));
    assertThat(trial.stdout().lines().filter(line -> line.startsWith("heap=")))
        .singleElement()
        .satisfies(
            line ->
                assertThat(Long.parseLong(line.substring("heap=".length())))
                    .isBetween(HEAP * 9 / 10, HEAP));
  }

  @Test
  void ends_with_itsOwnCode_whenTheHeapIsExhausted() throws IOException {
    JavaCommand command = command(classPath, "fill");
    command.makeFolders();

    assertThat(run(command.line()).code()).hasValue(JavaCommand.HEAP_EXHAUSTED);
  }

  @Test
  void keeps_archive_valid_whenMadeTwiceAtATime_andAFamilyIsAppended() throws IOException {
    useJarsWithoutSpaces();
    ClassArchive archives =
        new ClassArchive(
            new CacheFolder(temporary.resolve("my cache"), Optional.empty()),
            Launcher.unnoted(Tools.detect()));
    JavaCommand training = command(classPath.withoutFamily());
    Path archive =
        Stream.of(training, training)
            .parallel()
            .map(command -> make(archives, command))
            .reduce((first, second) -> first)
            .orElseThrow();
    List<String> line = new ArrayList<>(command(classPath).with(archive).line());
    line.add(1, "-Xlog:class+load:file=" + LOADED);
    Exit exit = run(line);

    assertThat(exit.clean()).isTrue();
    assertThat(Files.readAllLines(trial.folder.resolve(LOADED)))
        .anyMatch(
            loaded ->
                loaded.contains(ReportProgram.class.getName())
                    && loaded.contains("shared objects file (top)"));
    assertThat(archives.of(training, trial.stop)).isEqualTo(archive);
    try (var files = Files.list(archive.getParent())) {
      assertThat(files).containsExactly(archive);
    }
  }

  private Path make(ClassArchive archives, JavaCommand training) {
    try {
      return archives.of(training, trial.stop);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** JDK 17 archives no class of a jar with a space in its path. */
  private void useJarsWithoutSpaces() throws IOException {
    Path core = TestJars.withClass(temporary.resolve("jars/core.jar"), ReportProgram.class);
    classPath = new ClassPath(List.of(core), List.of(), classPath.family());
  }

  @Test
  void makes_no_archive_andSaysWhy_whenTheTrainingRunFails() {
    ClassArchive archives =
        new ClassArchive(
            new CacheFolder(temporary.resolve("my cache"), Optional.empty()),
            Launcher.unnoted(Tools.detect()));
    JavaCommand failing = command(classPath.withoutFamily(), "load", "nosuchlibrary");

    assertThatThrownBy(() -> archives.of(failing, trial.stop))
        .isInstanceOf(IOException.class)
        .hasMessageContaining("nosuchlibrary");
    assertThat(temporary.resolve("my cache/archives")).isEmptyDirectory();
  }

  /** The libraries as published: their jar is on the class path of this test. */
  @Test
  void loads_native_libraries_fromTheCache_andUnpacksNothing() throws IOException {
    String inside = "ortools-linux-x86-64";
    Path jar =
        List.of(System.getProperty("java.class.path").split(":", -1)).stream()
            .filter(entry -> entry.contains(inside))
            .map(Path::of)
            .findFirst()
            .orElseThrow();
    CacheFolder cache = new CacheFolder(temporary.resolve("my cache"), Optional.empty());
    Path natives = new NativeCache(cache).unpacked(jar, inside);
    JavaCommand command =
        new JavaCommand(
            classPath,
            ReportProgram.class.getName(),
            List.of("load", "jniortools"),
            trial.folder,
            HEAP,
            1,
            Optional.of(natives),
            Optional.empty());
    command.makeFolders();
    Exit exit = run(command.line());

    assertThat(exit.stderr()).isEmpty();
    assertThat(trial.stdout().lines()).contains("loaded=jniortools");
    assertThat(command.temporaryFolder()).isEmptyDirectory();
  }

  @Test
  void takes_heap_asAShare_inWholeMebibytes() {
    assertThat(JavaCommand.heapBytes(1000 * Trial.MEBIBYTE, 0.2)).isEqualTo(200 * Trial.MEBIBYTE);
    assertThat(JavaCommand.heapBytes(1001 * Trial.MEBIBYTE, 0.85)).isEqualTo(850 * Trial.MEBIBYTE);
    assertThat(JavaCommand.heapBytes(10 * Trial.MEBIBYTE, 1)).isEqualTo(32 * Trial.MEBIBYTE);
    assertThatThrownBy(() -> JavaCommand.heapBytes(1, 1.5)).hasMessageContaining("1.5");
  }

  @Test
  void refuses_classPath_thatTheJvmWouldCutInTwo() {
    assertThatThrownBy(() -> new ClassPath(List.of(Path.of("/a:b/c.jar")), List.of(), List.of()))
        .hasMessage("a class path cannot hold /a:b/c.jar: rename it without ':'");
  }
}
