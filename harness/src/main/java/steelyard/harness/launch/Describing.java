package steelyard.harness.launch;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import steelyard.adapters.spi.Description;
import steelyard.harness.sweep.Catalogue;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.harness.worker.Event;
import steelyard.variants.model.Digester;

/**
 * Asks a worker which families and backends there are: foreign code is never loaded here. The
 * answer is kept until an installed file changes.
 */
public final class Describing {
  private static final Duration WITHIN = Duration.ofSeconds(30);
  private static final long MEMORY_BYTES = 1L << 30;
  private static final double HEAP_SHARE = 0.5;

  private final Crew crew;

  public Describing(Crew crew) {
    this.crew = crew;
  }

  /**
   * What is installed, and what the named family jars add.
   *
   * @throws HarnessProblem if the worker that is asked fails
   */
  public Catalogue catalogue() {
    Path file = file();
    if (Files.exists(file)) {
      try {
        return Catalogue.ofJson(Files.readString(file), file.toString());
      } catch (IOException | SweepProblem e) {
        // A torn or older file is made again.
        return ask(file);
      }
    }
    return ask(file);
  }

  private Path file() {
    Digester digester = new Digester();
    for (Map.Entry<String, String> entry : crew.installation().fingerprint().entrySet()) {
      digester.add(entry.getKey()).add(entry.getValue());
    }
    digester.add(System.getProperty("java.vm.version"));
    try {
      return crew.cache().folder("catalogues").resolve(digester.digest().hex() + ".json");
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write to the cache folder", e);
    }
  }

  private Catalogue ask(Path file) {
    Catalogue catalogue = of(describe(Optional.empty()));
    for (String alias : crew.installation().aliases()) {
      catalogue = beside(catalogue, describe(Optional.of(alias)), alias);
    }
    // Folders of classes change without their own time of change.
    if (crew.installation().isPacked()) {
      keep(catalogue, file);
    }
    return catalogue;
  }

  private WorkerEnd describe(Optional<String> alias) {
    return Errands.once(crew, folder -> task(folder, alias))
        .orThrow("describing what is installed" + alias.map(a -> " as " + a).orElse(""));
  }

  private WorkerTask task(Path folder, Optional<String> alias) {
    return new WorkerTask(
        "describe",
        List.of("describe"),
        folder,
        crew.installation().everything(alias),
        "",
        HEAP_SHARE,
        1,
        List.of(),
        Crew.service(WITHIN, MEMORY_BYTES));
  }

  /** The catalogue with the families that only a version's jars have. */
  private Catalogue beside(Catalogue catalogue, WorkerEnd end, String alias) {
    CodeDigests code = new CodeDigests(crew.installation());
    List<Catalogue.Family> families = new ArrayList<>(catalogue.families());
    end.all(Event.Family.class)
        .filter(family -> !crew.installation().core().contains(Path.of(family.place())))
        .forEach(family -> families.add(family(family, Optional.of(alias), code)));
    if (families.size() == catalogue.families().size()) {
      throw new HarnessProblem("the jars given as " + alias + " hold no family");
    }
    return new Catalogue(families, catalogue.backends(), catalogue.missing());
  }

  private static void keep(Catalogue catalogue, Path file) {
    Path beside = file.resolveSibling(file.getFileName() + "." + ProcessHandle.current().pid());
    try {
      Files.write(beside, catalogue.toJson().getBytes(StandardCharsets.UTF_8));
      Files.move(beside, file, StandardCopyOption.ATOMIC_MOVE);
    } catch (IOException e) {
      return; // it is asked again next time
    }
  }

  private Catalogue of(WorkerEnd end) {
    CodeDigests code = new CodeDigests(crew.installation());
    List<Catalogue.Family> families = new ArrayList<>();
    end.all(Event.Family.class)
        .forEach(family -> families.add(family(family, Optional.empty(), code)));
    List<Catalogue.Backend> backends = new ArrayList<>();
    end.all(Event.Backend.class).forEach(b -> backends.add(backend(b.description(), code)));
    List<Catalogue.Missing> missing = new ArrayList<>();
    end.all(Event.Missing.class)
        .forEach(m -> missing.add(new Catalogue.Missing(m.name(), m.reason())));
    return new Catalogue(families, backends, missing);
  }

  private Catalogue.Family family(Event.Family it, Optional<String> alias, CodeDigests code) {
    return new Catalogue.Family(
        it.name(),
        alias,
        it.summary(),
        code.family(Path.of(it.place()), it.inside()),
        crew.installation().instances(it.name()),
        it.amendments().stream()
            .map(
                a ->
                    new Catalogue.Amendment(
                        a.name(),
                        a.role(),
                        a.summary(),
                        new TreeSet<>(a.requires()),
                        new TreeSet<>(a.excludes())))
            .toList());
  }

  private static Catalogue.Backend backend(Description it, CodeDigests code) {
    return new Catalogue.Backend(
        it.name(),
        it.version(),
        code.backend(it.name()),
        it.followsBranching(),
        it.portable(),
        it.goals().stream()
            .map(goal -> goal.getSimpleName().toLowerCase(Locale.ROOT))
            .sorted()
            .toList(),
        it.workUnits(),
        it.settings(),
        it.heapShare());
  }
}
