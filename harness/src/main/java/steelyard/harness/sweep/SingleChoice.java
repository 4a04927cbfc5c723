package steelyard.harness.sweep;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Function;
import steelyard.adapters.spi.Setting;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;
import steelyard.harness.sweep.text.Place;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.ledger.BackendBuild;
import steelyard.results.ledger.Limits;
import steelyard.results.ledger.Observation;

/** One candidate on one instance, as chosen on a command line. Mistakes are told as in a file. */
public final class SingleChoice {
  private SingleChoice() {}

  /** A variant, and the version of the family that it belongs to. */
  public record Chosen(Catalogue.Family family, Variant variant) {}

  /**
   * The family of that name; that without an alias where there are several versions.
   *
   * @throws SweepProblem if there is none
   */
  public static Catalogue.Family family(Catalogue catalogue, String name) {
    return versions(catalogue, name).main();
  }

  private static FamilyVersions versions(Catalogue catalogue, String name) {
    List<String> known =
        catalogue.families().stream().map(Catalogue.Family::name).distinct().toList();
    return FamilyVersions.find(catalogue, name).orElseThrow(() -> unknown("family", name, known));
  }

  /**
   * An instance by its name among those that the family ships, or by its file.
   *
   * @throws SweepProblem if it is neither
   */
  public static Instance instance(Catalogue.Family family, String text) {
    List<ListedInstance> shipped = shipped(family);
    Optional<ListedInstance> named =
        shipped.stream().filter(each -> each.name().equals(text)).findFirst();
    if (named.isPresent()) {
      return read(named.get());
    }
    Path file = Path.of(text);
    if (Files.isRegularFile(file)) {
      Path absolute = file.toAbsolutePath();
      return read(ListedInstance.of(absolute.getParent(), absolute, Place.of(text)));
    }
    List<String> names = shipped.stream().map(ListedInstance::name).toList();
    throw new SweepProblem(
        List.of(
            Phrases.unknown("instance", text, names) + ", and no file of that name",
            "  " + Phrases.known(names)));
  }

  /**
   * The name of the one family that ships an instance of that name.
   *
   * @throws SweepProblem if none does or several do
   */
  public static String shipping(Catalogue catalogue, String instance) {
    List<String> families =
        catalogue.families().stream()
            .filter(family -> shipped(family).stream().anyMatch(i -> i.name().equals(instance)))
            .map(Catalogue.Family::name)
            .distinct()
            .toList();
    if (families.size() == 1) {
      return families.get(0);
    }
    String ship = families.isEmpty() ? "no family ships" : String.join(" and ", families) + " ship";
    throw new SweepProblem(
        List.of(
            ship + " an instance " + Phrases.quoted(instance),
            "  name the family: --family " + (families.isEmpty() ? "NAME" : families.get(0))));
  }

  /** The instances that a family ships, a line each: name, class, sets, best known objective. */
  public static List<String> listed(Catalogue.Family family) {
    return shipped(family).stream()
        .map(
            it ->
                "%s  %s  %s  %s"
                    .formatted(
                        it.name(),
                        it.instanceClass(),
                        String.join(", ", it.sets()),
                        it.known().isPresent() ? "best known " + it.known().getAsLong() : ""))
        .map(String::stripTrailing)
        .toList();
  }

  private static List<ListedInstance> shipped(Catalogue.Family family) {
    return family
        .instances()
        .map(folder -> InstanceFolder.read(folder, folder.toString(), new Mistakes()))
        .orElse(List.of());
  }

  private static Instance read(ListedInstance listed) {
    try {
      return new Instance(
          listed.name(),
          listed.path(),
          InstancesReader.sha256(listed.path()),
          Files.size(listed.path()),
          listed.sets(),
          listed.instanceClass(),
          listed.weight(),
          listed.date(),
          listed.known());
    } catch (IOException e) {
      throw new SweepProblem(List.of("cannot read the instance file " + listed.path()));
    }
  }

  /**
   * The variant of a name such as {@code plain+a+b} or {@code plain+a@old}.
   *
   * @throws SweepProblem if one is unknown or they cannot be combined
   */
  public static Chosen variant(Catalogue catalogue, String family, String text) {
    FamilyVersions versions = versions(catalogue, family);
    FamilyVersions.Parts parts = FamilyVersions.Parts.of(text);
    Catalogue.Family version =
        versions.of(parts.alias()).orElseThrow(() -> noVersion(versions, parts.alias()));
    if (!parts.isPlain()) {
      throw new SweepProblem(
          List.of(
              "a variant begins with 'plain', as in plain+"
                  + version.names().stream().findFirst().orElse("amendment")
                  + ", not "
                  + Phrases.quoted(text)));
    }
    for (String part : parts.amendments()) {
      if (!version.names().contains(part)) {
        throw unknown("amendment", part, version.names());
      }
    }
    Optional<String> conflict = version.conflict(parts.amendments());
    if (conflict.isPresent()) {
      throw new SweepProblem(List.of("variant " + Phrases.quoted(text) + ": " + conflict.get()));
    }
    return new Chosen(version, new Variant(version.inOrder(parts.amendments()), parts.alias()));
  }

  private static SweepProblem noVersion(FamilyVersions versions, Optional<String> alias) {
    return alias
        .map(name -> unknown("version of " + versions.name(), name, versions.aliases()))
        .orElseGet(
            () ->
                new SweepProblem(
                    List.of(
                        "which version of "
                            + versions.name()
                            + "? give --variant plain@"
                            + versions.aliases().get(0),
                        "  " + Phrases.known(versions.aliases()))));
  }

  /**
   * A backend with options over its defaults.
   *
   * @param builds which build of a backend runs
   * @throws SweepProblem if an option is unknown, a value out of its range, or a program that it
   *     names cannot be used
   */
  public static Setup setup(
      Catalogue.Backend backend,
      Builds builds,
      Map<String, String> given,
      int threads,
      Limits limits) {
    String name = backend.name();
    requireKnown(backend, given.keySet());
    SortedMap<String, String> options = new TreeMap<>();
    for (Setting option : backend.settings()) {
      String text = given.getOrDefault(option.name(), option.defaultText());
      String mistake = option.mistakeIn(text);
      if (!mistake.isEmpty()) {
        throw new SweepProblem(List.of("option " + option.name() + " of " + name + ": " + mistake));
      }
      options.put(option.name(), text);
    }
    limits
        .work()
        .filter(work -> !backend.workUnits().contains(work.unit()))
        .ifPresent(
            work -> {
              throw unknown("unit of work", work.unit(), backend.workUnits());
            });
    Builds.Build build = build(builds, backend, options);
    return new Setup(
        new BackendBuild(name, name, build.version(), build.code()),
        new steelyard.results.ledger.Setting(
            given.isEmpty() ? Observation.DEFAULT_SETTING : "chosen", options),
        threads,
        limits);
  }

  private static Builds.Build build(
      Builds builds, Catalogue.Backend backend, SortedMap<String, String> options) {
    try {
      return builds.of(backend, options);
    } catch (IllegalArgumentException e) {
      throw new SweepProblem(List.of("backend " + backend.name() + ": " + e.getMessage()));
    }
  }

  /**
   * The backend of that name that can run.
   *
   * @throws SweepProblem if there is none; says why where it is known
   */
  public static Catalogue.Backend backend(Catalogue catalogue, String name) {
    Function<String, SweepProblem> cannot =
        reason -> new SweepProblem(List.of("backend " + name + " cannot run here: " + reason));
    return catalogue
        .backend(name)
        .orElseThrow(
            () ->
                catalogue
                    .whyMissing(name)
                    .map(cannot)
                    .orElseGet(
                        () ->
                            unknown(
                                "backend",
                                name,
                                catalogue.backends().stream()
                                    .map(Catalogue.Backend::name)
                                    .toList())));
  }

  private static void requireKnown(Catalogue.Backend backend, Collection<String> given) {
    for (String option : given) {
      if (!backend.options().contains(option)) {
        throw unknown("option", option, backend.options());
      }
    }
  }

  private static SweepProblem unknown(String kind, String found, Collection<String> known) {
    return new SweepProblem(
        List.of(Phrases.unknown(kind, found, known), "  " + Phrases.known(known)));
  }
}
