package steelyard.harness.process;

import java.io.File;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.Stream;

/**
 * The class path of a worker: our own jars, then those of one backend, then those of families. The
 * order matters: an archive of classes holds for a class path that begins with the one it was made
 * for, so what is not in the archive comes last.
 */
public record ClassPath(List<Path> core, List<Path> backend, List<Path> family) {
  public ClassPath {
    core = absolute(core);
    backend = absolute(backend);
    family = absolute(family);
  }

  private static List<Path> absolute(List<Path> jars) {
    return jars.stream().map(ClassPath::absolute).toList();
  }

  private static Path absolute(Path jar) {
    Path path = jar.toAbsolutePath().normalize();
    if (path.toString().contains(File.pathSeparator)) {
      throw new IllegalArgumentException(
          "a class path cannot hold " + path + ": rename it without '" + File.pathSeparator + "'");
    }
    return path;
  }

  /** All jars in order. */
  public List<Path> jars() {
    return Stream.of(core, backend, family).flatMap(List::stream).toList();
  }

  /** The part that an archive of classes is made for. */
  public ClassPath withoutFamily() {
    return new ClassPath(core, backend, List.of());
  }

  String joined() {
    return jars().stream().map(Path::toString).collect(Collectors.joining(File.pathSeparator));
  }
}
