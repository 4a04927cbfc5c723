package steelyard.harness.launch;

import java.io.File;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import steelyard.harness.process.ClassPath;

/**
 * What is installed where: our own jars, the libraries of each backend in a folder of its own, jars
 * of families, and shared files.
 *
 * <pre>
 * lib/core/*.jar            what every worker loads
 * lib/backends/NAME/*.jar   what the workers of backend NAME load beside
 * share/instances/FAMILY/   the instances that a family ships
 * </pre>
 *
 * @param core jars, or folders of classes while developing
 * @param backends the jars of each backend that has any
 * @param families jars of families that somebody named, by alias; those without one under the empty
 *     text
 * @param share where shared files lie; empty while developing without any
 */
public record Installation(
    List<Path> core,
    SortedMap<String, List<Path>> backends,
    SortedMap<String, List<Path>> families,
    Optional<Path> share) {

  /** Names the folder of the installation; set by the start script. */
  public static final String HOME = "steelyard.home";

  /** Names a folder of shared files where nothing is installed. */
  public static final String SHARE = "steelyard.share";

  public Installation {
    core = List.copyOf(core);
    backends = Collections.unmodifiableSortedMap(new TreeMap<>(backends));
    families = Collections.unmodifiableSortedMap(new TreeMap<>(families));
  }

  /**
   * The installation that this process was started from; while developing, its own class path.
   *
   * @throws HarnessProblem if the folder is not an installation
   */
  public static Installation here() {
    String home = System.getProperty(HOME);
    if (home == null) {
      List<Path> path =
          Stream.of(System.getProperty("java.class.path").split(File.pathSeparator, -1))
              .filter(entry -> !entry.isEmpty())
              .map(entry -> Path.of(entry).toAbsolutePath())
              .toList();
      Optional<Path> share = Optional.ofNullable(System.getProperty(SHARE)).map(Path::of);
      return new Installation(path, new TreeMap<>(), new TreeMap<>(), share);
    }
    return in(Path.of(home).toAbsolutePath());
  }

  private static Installation in(Path home) {
    Path lib = home.resolve("lib");
    SortedMap<String, List<Path>> backends = new TreeMap<>();
    for (Path folder : entries(lib.resolve("backends"))) {
      backends.put(folder.getFileName().toString(), jars(folder));
    }
    return new Installation(
        jars(lib.resolve("core")), backends, new TreeMap<>(), Optional.of(home.resolve("share")));
  }

  private static List<Path> jars(Path folder) {
    return entries(folder).stream().filter(path -> path.toString().endsWith(".jar")).toList();
  }

  private static List<Path> entries(Path folder) {
    try (Stream<Path> entries = Files.list(folder)) {
      return entries.sorted().toList();
    } catch (IOException e) {
      throw new HarnessProblem(
          "the installation is incomplete: cannot read " + folder + "; install it again", e);
    }
  }

  /**
   * The same with jars of families beside.
   *
   * @throws HarnessProblem if one is not there
   */
  public Installation with(SortedMap<String, List<Path>> jars) {
    for (Path jar : jars.values().stream().flatMap(List::stream).toList()) {
      if (!Files.isReadable(jar)) {
        throw new HarnessProblem("cannot read the family jar " + jar);
      }
    }
    return new Installation(core, backends, jars, share);
  }

  /** What the workers of a backend load that run a version of a family. */
  public ClassPath classPath(String backend, Optional<String> alias) {
    return new ClassPath(core, backends.getOrDefault(backend, List.of()), families(alias));
  }

  /** What a worker loads that asks no solver. */
  public ClassPath withoutBackends(Optional<String> alias) {
    return new ClassPath(core, List.of(), families(alias));
  }

  /** What a worker loads that describes everything. */
  public ClassPath everything(Optional<String> alias) {
    List<Path> libraries = backends.values().stream().flatMap(List::stream).toList();
    return new ClassPath(core, libraries, families(alias));
  }

  /** The jars of one version; versions never see each other. */
  private List<Path> families(Optional<String> alias) {
    return families.getOrDefault(alias.orElse(""), List.of());
  }

  /** The names of versions of families that stand beside the one without a name. */
  public List<String> aliases() {
    return families.keySet().stream().filter(alias -> !alias.isEmpty()).toList();
  }

  private Stream<Path> jars() {
    return Stream.of(
            everything(Optional.empty()).jars(),
            families.values().stream().flatMap(List::stream).toList())
        .flatMap(List::stream)
        .distinct();
  }

  /** Whether classes come from jars, as an archive of classes needs. */
  public boolean isPacked() {
    return core.stream().allMatch(path -> path.toString().endsWith(".jar"));
  }

  /** The folder of the instances that a family ships. */
  public Optional<Path> instances(String family) {
    return share
        .map(folder -> folder.resolve("instances").resolve(family))
        .filter(Files::isDirectory);
  }

  /** A jar of the class path whose file name begins with {@code start}. */
  public Optional<Path> jar(String start) {
    return jars().filter(path -> path.getFileName().toString().startsWith(start)).findFirst();
  }

  /** The installed files as {@code name -> size and time of change}: what caches depend on. */
  SortedMap<String, String> fingerprint() {
    return jars()
        .collect(Collectors.toMap(Path::toString, Installation::stamp, (a, b) -> a, TreeMap::new));
  }

  private static String stamp(Path path) {
    try {
      return Files.size(path) + " " + Files.getLastModifiedTime(path);
    } catch (IOException e) {
      return "missing";
    }
  }

  /** The jars of each backend. */
  Map<String, List<Path>> libraries() {
    return backends;
  }
}
