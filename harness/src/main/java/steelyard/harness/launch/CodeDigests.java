package steelyard.harness.launch;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import steelyard.results.ledger.Digest;
import steelyard.variants.model.Digester;

/**
 * Digests of the code that an answer depends on. A version kept by hand would be forgotten; the
 * bytes are not. Our own jars count by the packages concerned, so that a change of the brief makes
 * no run new; foreign jars count whole.
 */
final class CodeDigests {
  private static final String MODEL = "steelyard/variants/model/";
  private static final String FAMILY = "steelyard/variants/family/";
  private static final String SPI = "steelyard/adapters/spi/";
  private static final String ADAPTERS = "steelyard/adapters/";
  private static final String WORKER = "steelyard/harness/worker/";

  /** Packages of other adapters that an adapter is built on. */
  private static final Map<String, List<String>> SHARED =
      Map.of("program", List.of(ADAPTERS + "sat/encoding/"));

  private final Installation installation;

  CodeDigests(Installation installation) {
    this.installation = installation;
  }

  /** The adapter, what adapters share, and the libraries of the backend. */
  Digest backend(String adapter) {
    Digester digester = new Digester().add("backend").add(adapter);
    List<String> inside = new ArrayList<>(List.of(MODEL, SPI, ADAPTERS + adapter + "/"));
    inside.addAll(SHARED.getOrDefault(adapter, List.of()));
    add(digester, installation.core(), inside);
    for (Path jar : installation.libraries().getOrDefault(adapter, List.of())) {
      digester.add(jar.getFileName().toString());
      file(digester, jar);
    }
    return digest(digester);
  }

  /** The code of a backend together with the program that it starts. */
  static Digest with(Digest backend, Path program) {
    Digester digester = new Digester().add("program").add(backend.hex());
    file(digester, program);
    return digest(digester);
  }

  /**
   * The family, and what building a model goes through.
   *
   * @param place the jar or folder of the family's class
   * @param inside its package
   */
  Digest family(Path place, String inside) {
    Digester digester = new Digester().add("family");
    add(digester, installation.core(), List.of(MODEL, FAMILY));
    boolean own = installation.core().contains(place);
    add(digester, List.of(place), List.of(own ? inside.replace('.', '/') + "/" : ""));
    return digest(digester);
  }

  /** What judges answers, the families aside. */
  Digest judge() {
    Digester digester = new Digester().add("judge");
    add(digester, installation.core(), List.of(MODEL, FAMILY, WORKER));
    return digest(digester);
  }

  private static Digest digest(Digester digester) {
    return new Digest(digester.digest().hex());
  }

  /** The entries below any of the prefixes, by name, wherever they lie. */
  private static void add(Digester digester, Collection<Path> places, List<String> prefixes) {
    SortedMap<String, byte[]> entries = new TreeMap<>();
    for (Path place : places) {
      try {
        if (Files.isDirectory(place)) {
          collectFolder(place, prefixes, entries);
        } else if (Files.exists(place)) {
          collectJar(place, prefixes, entries);
        }
      } catch (IOException e) {
        throw HarnessProblem.of("cannot read " + place, e);
      }
    }
    entries.forEach((name, bytes) -> digester.add(name).add(bytes));
  }

  private static void collectFolder(
      Path folder, List<String> prefixes, SortedMap<String, byte[]> entries) throws IOException {
    try (Stream<Path> files = Files.walk(folder)) {
      for (Path file : files.filter(Files::isRegularFile).toList()) {
        String name = folder.relativize(file).toString().replace('\\', '/');
        if (prefixes.stream().anyMatch(name::startsWith)) {
          entries.putIfAbsent(name, Files.readAllBytes(file));
        }
      }
    }
  }

  private static void collectJar(Path jar, List<String> prefixes, SortedMap<String, byte[]> entries)
      throws IOException {
    try (ZipFile zip = new ZipFile(jar.toFile())) {
      for (ZipEntry entry : zip.stream().filter(e -> !e.isDirectory()).toList()) {
        if (prefixes.stream().anyMatch(entry.getName()::startsWith)) {
          try (InputStream in = zip.getInputStream(entry)) {
            entries.putIfAbsent(entry.getName(), in.readAllBytes());
          }
        }
      }
    }
  }

  private static void file(Digester digester, Path file) {
    try {
      digester.add(Files.readAllBytes(file));
    } catch (IOException e) {
      throw HarnessProblem.of("cannot read " + file, e);
    }
  }
}
