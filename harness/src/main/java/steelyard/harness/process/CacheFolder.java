package steelyard.harness.process;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.LinkOption;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.Map;
import java.util.Optional;

/**
 * Where things are kept that can be made again: {@code $XDG_CACHE_HOME/steelyard}, else {@code
 * ~/.cache/steelyard}, else a folder for temporary files.
 *
 * <p>Source: XDG Base Directory Specification 0.8; a value that is not absolute is ignored.
 *
 * @param root exists and can be written
 * @param warning one line if the usual place cannot be written
 */
public record CacheFolder(Path root, Optional<String> warning) {

  /** For this user on this machine. */
  public static CacheFolder here() throws IOException {
    return locate(
        System.getenv(),
        Path.of(System.getProperty("user.home")),
        Path.of(System.getProperty("java.io.tmpdir")),
        System.getProperty("user.name"));
  }

  static CacheFolder locate(Map<String, String> environment, Path home, Path temporary, String user)
      throws IOException {
    Path usual =
        Optional.ofNullable(environment.get("XDG_CACHE_HOME"))
            .filter(value -> !value.isEmpty())
            .map(Path::of)
            .filter(Path::isAbsolute)
            .orElse(home.resolve(".cache"))
            .resolve("steelyard");
    try {
      requireWritable(usual);
      return new CacheFolder(usual, Optional.empty());
    } catch (IOException e) {
      Path instead = ownFolder(temporary.resolve("steelyard-" + user), user);
      return new CacheFolder(
          instead,
          Optional.of(
              "cannot write the cache "
                  + usual
                  + ": using "
                  + instead
                  + "; set XDG_CACHE_HOME to a folder that can be written"));
    }
  }

  /** A subfolder, made if need be. */
  public Path folder(String name) throws IOException {
    return Files.createDirectories(root.resolve(name));
  }

  private static void requireWritable(Path folder) throws IOException {
    Files.createDirectories(folder);
    Files.delete(Files.createTempFile(folder, "try", ".tmp"));
  }

  /** In a place that all may write, a folder of that name may be somebody else's. */
  private static Path ownFolder(Path wanted, String user) throws IOException {
    var own = PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("rwx------"));
    try {
      return Files.createDirectory(wanted, own);
    } catch (IOException e) {
      boolean ours =
          Files.isDirectory(wanted, LinkOption.NOFOLLOW_LINKS)
              && Files.getOwner(wanted).getName().equals(user);
      return ours ? wanted : Files.createTempDirectory(wanted.getParent(), "steelyard-", own);
    }
  }
}
