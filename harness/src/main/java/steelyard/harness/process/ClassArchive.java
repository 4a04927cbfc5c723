package steelyard.harness.process;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.DirectoryStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.attribute.FileTime;
import java.security.MessageDigest;
import java.time.Duration;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.UUID;

/**
 * Archives of loaded classes (application class-data sharing, JEP 350), which shorten the start of
 * a worker. One is made at first use and kept in the cache.
 *
 * <p>An archive holds for one JVM and for jars at the same absolute paths with the same time of
 * change; the JVM silently ignores any other. Its name is therefore a digest of these and of the
 * jars' content. It is made beside and moved into place: two harnesses that make the same one at a
 * time both end with a whole file.
 *
 * <p>JDK 17 leaves the classes of a jar out if its path holds a space (seen with 17.0.15, not with
 * 25): the archive then speeds up nothing, and harms nothing.
 */
public final class ClassArchive {
  private static final String SUFFIX = ".jsa";
  private static final Duration MAKING = Duration.ofSeconds(60);
  private static final long MAKING_MEMORY_BYTES = 4L << 30;

  /** Every build of our jars makes new ones. */
  private static final int KEPT = 24;

  private final CacheFolder cache;
  private final Launcher launcher;

  public ClassArchive(CacheFolder cache, Launcher launcher) {
    this.cache = cache;
    this.launcher = launcher;
  }

  /**
   * The archive for a class path.
   *
   * @param training loads the classes that a run will need, and then ends by returning or by {@code
   *     System.exit} (a halt would write no archive); its class path has no family
   * @throws IOException with one sentence if it cannot be made; a worker then starts without
   */
  public Path of(JavaCommand training, StopSwitch stop) throws IOException {
    if (!training.classPath().family().isEmpty()) {
      throw new IllegalArgumentException("an archive is for all families, hence made without any");
    }
    Path folder = cache.folder("archives");
    Path archive = folder.resolve(key(training.classPath()) + SUFFIX);
    if (!Files.exists(archive)) {
      make(training, archive, stop);
      removeOldest(folder);
    }
    return archive;
  }

  private void make(JavaCommand training, Path archive, StopSwitch stop) throws IOException {
    String tag = UUID.randomUUID().toString();
    Path beside = archive.resolveSibling(archive.getFileName() + "." + tag);
    List<String> line = new ArrayList<>(training.line());
    line.add(1, "-XX:ArchiveClassesAtExit=" + beside);
    training.makeFolders();
    Launch launch =
        Launch.of("class archive", tag, line, training.folder()).withhold(JavaCommand.WITHHELD);
    try {
      ProcessLimits limits = ProcessLimits.plain(MAKING, MAKING_MEMORY_BYTES);
      Exit exit = new Watch(launcher.start(launch), limits, PhaseSource.none(), stop).await();
      if (!exit.clean() || !Files.exists(beside)) {
        throw new IOException("no class archive: its training run failed: " + exit.stderr());
      }
      Files.move(beside, archive, StandardCopyOption.ATOMIC_MOVE);
    } finally {
      Files.deleteIfExists(beside);
    }
  }

  private static String key(ClassPath classPath) throws IOException {
    MessageDigest digest = Digests.sha256();
    add(digest, System.getProperty("java.home"));
    add(digest, System.getProperty("java.vm.version"));
    for (Path jar : classPath.jars()) {
      add(digest, jar.toString());
      add(digest, Files.getLastModifiedTime(jar).toString());
      add(digest, Digests.of(jar));
    }
    return Digests.hex(digest);
  }

  private static void add(MessageDigest digest, String text) {
    digest.update((text + "\n").getBytes(StandardCharsets.UTF_8));
  }

  /** A JVM that has one of them mapped keeps it; the next run of that build makes it again. */
  private static void removeOldest(Path folder) throws IOException {
    record Dated(FileTime time, Path archive) {}
    List<Dated> all = new ArrayList<>();
    try (DirectoryStream<Path> archives = Files.newDirectoryStream(folder, "*" + SUFFIX)) {
      for (Path archive : archives) {
        all.add(new Dated(Files.getLastModifiedTime(archive), archive));
      }
    }
    all.sort(Comparator.comparing(Dated::time));
    for (Dated oldest : all.subList(0, Math.max(0, all.size() - KEPT))) {
      Files.deleteIfExists(oldest.archive());
    }
  }
}
