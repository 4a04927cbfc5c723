package steelyard.harness.sweep;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.apache.commons.rng.UniformRandomProvider;
import steelyard.adapters.spi.Setting;
import steelyard.results.ledger.BackendBuild;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Limits;
import steelyard.results.statistics.TieMargin;

/** A tileworks' catalogue, and sweeps drawn at random. */
final class Samples {

  private Samples() {}

  static Digest digest(String text) {
    try {
      byte[] bytes = text.getBytes(StandardCharsets.UTF_8);
      return Digest.of(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException(e);
    }
  }

  static Path resource(String name) {
    try {
      return Path.of(Samples.class.getResource(name).toURI());
    } catch (URISyntaxException e) {
      throw new IllegalStateException(e);
    }
  }

  static Catalogue catalogue(Optional<Path> instances) {
    Catalogue.Family kiln =
        new Catalogue.Family(
            "kiln",
            Optional.empty(),
            "Lots of tiles into firings",
            digest("kiln code"),
            instances,
            List.of(
                amendment("load-bound", "implied", Set.of(), Set.of()),
                amendment("kiln-order", "symmetry", Set.of(), Set.of()),
                amendment("shelf-table", "reformulation", Set.of(), Set.of("kiln-order")),
                amendment("glaze-first", "search", Set.of("load-bound"), Set.of())));
    Catalogue.Family yard =
        new Catalogue.Family(
            "yard",
            Optional.empty(),
            "Pallets into trucks",
            digest("yard code"),
            Optional.empty(),
            List.of());
    return new Catalogue(
        List.of(kiln, yard),
        List.of(
            backend("sat", false, List.of("conflicts"), List.of()),
            backend(
                "cpsat",
                true,
                List.of("deterministic-seconds", "conflicts"),
                List.of(
                    Setting.integer("linearization", 1, 0, 2, "how much goes into the LP"),
                    Setting.flag("presolve", true, "simplify first"))),
            backend(
                "engine",
                true,
                List.of("nodes"),
                List.of(
                    Setting.choice("restarts", List.of("none", "luby"), "when to start anew"),
                    Setting.real("decay", 0.95, 0.5, 1, "how fast weights fade")))),
        List.of(new Catalogue.Missing("choco", "its library is not on the class path")));
  }

  static Catalogue catalogue() {
    return catalogue(Optional.of(resource("kiln")));
  }

  private static Catalogue.Amendment amendment(
      String name, String role, Set<String> requires, Set<String> excludes) {
    return new Catalogue.Amendment(
        name, role, "what " + name + " does", new TreeSet<>(requires), new TreeSet<>(excludes));
  }

  private static Catalogue.Backend backend(
      String name, boolean follows, List<String> units, List<Setting> settings) {
    return new Catalogue.Backend(
        name,
        "1.0",
        digest(name + " code"),
        follows,
        !follows,
        List.of("satisfy", "optimise", "enumerate"),
        units,
        settings,
        0.5);
  }

  /** Writes a sweep file and its folder's other files, and reads it. */
  static Sweep read(Path folder, String yaml) {
    Path file = folder.resolve("sweep.yaml");
    try {
      Files.writeString(file, yaml);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return SweepFile.read(file, catalogue());
  }

  static Setup setup(String name, double wallSeconds) {
    return new Setup(
        new BackendBuild(name, name, "1.0", digest(name)),
        new steelyard.results.ledger.Setting("default", new TreeMap<>()),
        1,
        new Limits(wallSeconds, Optional.empty(), 1_000_000_000));
  }

  static Instance instance(String name, String instanceClass, double weight, long bytes) {
    return new Instance(
        name,
        Path.of("/data", name),
        digest(name),
        bytes,
        List.of(),
        instanceClass,
        weight,
        Optional.empty(),
        OptionalLong.empty());
  }

  /** A contest of so many candidates, with pairs drawn at random, on instances of classes. */
  static Contest contest(
      UniformRandomProvider random, String family, int candidates, int instances, int classes) {
    List<Candidate> all = new ArrayList<>();
    for (int i = 0; i < candidates; i++) {
      all.add(new Candidate(Variant.of(i == 0 ? List.of() : List.of("a" + i)), setup("sat", 10)));
    }
    List<Instance> data = new ArrayList<>();
    for (int i = 0; i < instances; i++) {
      String label = "class" + random.nextInt(classes);
      data.add(instance("i" + i, label, 1 + random.nextInt(3), random.nextInt(1000)));
    }
    Set<Pair> pairs = new java.util.LinkedHashSet<>();
    for (int i = 0; i < candidates / 2; i++) {
      Candidate before = all.get(random.nextInt(candidates));
      Candidate after = all.get(random.nextInt(candidates));
      if (!before.equals(after)) {
        pairs.add(new Pair(before, after));
      }
    }
    Candidate inService = all.get(random.nextInt(candidates));
    return new Contest(
        family,
        new TreeMap<>(Map.of("", digest(family))),
        all,
        inService,
        List.copyOf(pairs),
        data,
        random.nextInt(3));
  }

  static Sweep sweep(String name, List<Contest> contests, int seeds, int blockSize) {
    List<Long> numbers = new ArrayList<>();
    for (long seed = 0; seed < seeds; seed++) {
      numbers.add(seed);
    }
    return new Sweep(
        "name: " + name,
        name,
        "",
        contests,
        numbers,
        new TieMargin(0.05, 0.05),
        2,
        Duration.ofMinutes(1),
        1,
        blockSize,
        List.of());
  }
}
