package steelyard.harness.sweep;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.Optional;
import java.util.Set;
import java.util.SortedSet;
import java.util.TreeSet;
import steelyard.adapters.spi.Description;
import steelyard.adapters.spi.Setting;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.results.ledger.Digest;

/**
 * What there is to compare and to compare on, as workers described it.
 *
 * @param families by unique names and aliases
 * @param backends those that can run, by unique names
 * @param missing backends that are known and cannot run here
 */
public record Catalogue(List<Family> families, List<Backend> backends, List<Missing> missing) {

  /**
   * A family as its code describes itself.
   *
   * @param alias the name of the version, where several stand side by side
   * @param summary one line
   * @param code digest of the family's code
   * @param instances the folder of the instances that it ships; empty if it ships none
   * @param amendments in the order of declaration, in which they apply
   */
  public record Family(
      String name,
      Optional<String> alias,
      String summary,
      Digest code,
      Optional<Path> instances,
      List<Amendment> amendments) {

    public Family {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(alias, "alias");
      Objects.requireNonNull(summary, "summary");
      Objects.requireNonNull(code, "code");
      Objects.requireNonNull(instances, "instances");
      amendments = List.copyOf(amendments);
      requireUnique("amendment", amendments.stream().map(Amendment::name).toList());
      List<String> names = amendments.stream().map(Amendment::name).toList();
      for (Amendment amendment : amendments) {
        requireKnown(name, amendment, amendment.requires(), names);
        requireKnown(name, amendment, amendment.excludes(), names);
      }
    }

    private static void requireKnown(
        String family, Amendment amendment, Set<String> named, List<String> known) {
      if (!known.containsAll(named)) {
        throw new IllegalArgumentException(
            "family %s: amendment %s requires or excludes one that does not exist: %s"
                .formatted(family, amendment.name(), named));
      }
    }

    /** {@code workshop}, or {@code workshop@old}. */
    public String label() {
      return alias.map(version -> name + Variant.AT + version).orElse(name);
    }

    /** The amendments' names in order of declaration. */
    public List<String> names() {
      return amendments.stream().map(Amendment::name).toList();
    }

    /** The amendments of these names, each once, in order of declaration. */
    public List<String> inOrder(Collection<String> chosen) {
      return names().stream().filter(chosen::contains).toList();
    }

    /** These amendments and all that they require, in order of declaration. */
    public List<String> withRequired(Collection<String> chosen) {
      Set<String> all = new HashSet<>(chosen);
      boolean grew = true;
      while (grew) {
        List<String> required = new ArrayList<>();
        amendments.stream()
            .filter(a -> all.contains(a.name()))
            .forEach(a -> required.addAll(a.requires()));
        grew = all.addAll(required);
      }
      return inOrder(all);
    }

    /** Why these amendments cannot be combined; empty if they can. */
    public Optional<String> conflict(Collection<String> chosen) {
      for (Amendment amendment : amendments) {
        if (chosen.contains(amendment.name())) {
          for (String required : amendment.requires()) {
            if (!chosen.contains(required)) {
              return Optional.of(amendment.name() + " requires " + required);
            }
          }
          for (String excluded : amendment.excludes()) {
            if (chosen.contains(excluded)) {
              return Optional.of(amendment.name() + " excludes " + excluded);
            }
          }
        }
      }
      return Optional.empty();
    }
  }

  /**
   * An amendment as its family describes it.
   *
   * @param role the role's label, such as {@code implied}
   * @param summary one line
   * @param requires amendments without which it does not apply
   * @param excludes amendments with which it does not apply
   */
  public record Amendment(
      String name,
      String role,
      String summary,
      SortedSet<String> requires,
      SortedSet<String> excludes) {
    public Amendment {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(role, "role");
      Objects.requireNonNull(summary, "summary");
      requires = new TreeSet<>(requires);
      excludes = new TreeSet<>(excludes);
    }
  }

  /**
   * A backend that can run.
   *
   * @param name the adapter's name
   * @param version of its solver
   * @param code digest of the adapter's code, its libraries, natives or program
   * @param followsBranching whether a model's branching and hint change its search
   * @param portable whether equal requests give equal counters on every machine and JDK
   * @param goals what it can be asked for
   * @param workUnits units of work that it can be limited by, the default first
   * @param settings its options
   * @param heapShare share of the memory limit to give to the Java heap, in (0, 1]
   */
  public record Backend(
      String name,
      String version,
      Digest code,
      boolean followsBranching,
      boolean portable,
      List<String> goals,
      List<String> workUnits,
      List<Setting> settings,
      double heapShare) {
    public Backend {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(version, "version");
      Objects.requireNonNull(code, "code");
      goals = List.copyOf(goals);
      workUnits = List.copyOf(workUnits);
      settings = List.copyOf(settings);
      if (!(heapShare > 0 && heapShare <= 1)) {
        throw new IllegalArgumentException("heap share must be in (0, 1], was " + heapShare);
      }
    }

    /**
     * What a backend says of itself.
     *
     * @param code digest of the adapter's code, its libraries, natives or program
     */
    public static Backend of(Description description, Digest code) {
      return new Backend(
          description.name(),
          description.version(),
          code,
          description.followsBranching(),
          description.portable(),
          description.goals().stream()
              .map(goal -> goal.getSimpleName().toLowerCase(Locale.ROOT))
              .sorted()
              .toList(),
          description.workUnits(),
          description.settings(),
          description.heapShare());
    }

    /** The options' names. */
    public List<String> options() {
      return settings.stream().map(Setting::name).toList();
    }
  }

  /**
   * A backend that cannot run here.
   *
   * @param reason one line
   */
  public record Missing(String name, String reason) {
    public Missing {
      Objects.requireNonNull(name, "name");
      Objects.requireNonNull(reason, "reason");
    }
  }

  public Catalogue {
    families = List.copyOf(families);
    backends = List.copyOf(backends);
    missing = List.copyOf(missing);
    requireUnique("family", families.stream().map(Family::label).toList());
    List<String> names = new ArrayList<>(backends.stream().map(Backend::name).toList());
    names.addAll(missing.stream().map(Missing::name).toList());
    requireUnique("backend", names);
  }

  private static void requireUnique(String kind, List<String> names) {
    if (new HashSet<>(names).size() < names.size()) {
      throw new IllegalArgumentException("a " + kind + " is described twice: " + names);
    }
  }

  /** The backend of this name that can run. */
  public Optional<Backend> backend(String name) {
    return backends.stream().filter(b -> b.name().equals(name)).findFirst();
  }

  /** Why the backend of this name cannot run; empty if it can or is not known. */
  public Optional<String> whyMissing(String name) {
    return missing.stream().filter(m -> m.name().equals(name)).map(Missing::reason).findFirst();
  }

  /** The catalogue as JSON. */
  public String toJson() {
    return Json.write(this);
  }

  /**
   * The catalogue that {@link #toJson()} wrote.
   *
   * @param shown where the text is from, for messages
   * @throws SweepProblem if it is not that
   */
  public static Catalogue ofJson(String json, String shown) {
    return Json.read(json, Catalogue.class, shown);
  }
}
