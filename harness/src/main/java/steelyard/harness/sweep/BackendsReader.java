package steelyard.harness.sweep;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.adapters.spi.Setting;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Phrases;
import steelyard.results.ledger.BackendBuild;
import steelyard.results.ledger.Observation;

/**
 * Reads {@code backends}: a list of names, or of entries that give a backend a name and options of
 * the person's own.
 */
final class BackendsReader {

  private static final List<String> KEYS =
      List.of("name", "backend", "options", "threads", "settings");
  private static final String THREADS = "threads";
  private static final Set<String> CHANGES = Set.of("options", THREADS);

  private final Catalogue catalogue;
  private final Allowances allowances;
  private final Builds builds;
  private final List<Setup> setups = new ArrayList<>();
  private final Set<String> names = new HashSet<>();

  BackendsReader(Catalogue catalogue, Allowances allowances, Builds builds) {
    this.catalogue = catalogue;
    this.allowances = allowances;
    this.builds = builds;
  }

  /** Every setting of every entry, in order. */
  List<Setup> read(Field field) {
    for (Field entry : field.itemsOrAlone()) {
      if (entry.isSingle()) {
        readName(entry);
      } else {
        readEntry(entry);
      }
    }
    return setups;
  }

  private void readName(Field entry) {
    entry
        .text()
        .flatMap(name -> backend(entry, name))
        .filter(backend -> isNew(entry, backend.name()))
        .ifPresent(
            backend ->
                add(
                    entry,
                    new Entry(backend.name(), backend, unchanged()),
                    Observation.DEFAULT_SETTING,
                    unchanged()));
  }

  private void readEntry(Field entry) {
    Keys keys = Keys.of(entry, KEYS);
    Optional<Field> named = keys.optional("name");
    Optional<Field> technology = keys.optional("backend").or(() -> named);
    if (technology.isEmpty()) {
      entry.mistake("names no backend", "for example: {name: cpsat-2, backend: cpsat}");
      return;
    }
    Optional<Catalogue.Backend> backend =
        technology.get().text().flatMap(name -> backend(technology.get(), name));
    Optional<String> name =
        named.isPresent() ? named.get().name() : backend.map(Catalogue.Backend::name);
    if (backend.isPresent() && name.isPresent()) {
      readSettings(named.orElse(entry), keys, name.get(), backend.get());
    }
  }

  private void readSettings(Field place, Keys keys, String name, Catalogue.Backend backend) {
    Entry entry = new Entry(name, backend, common(keys, backend));
    if (entry.isRenamed() && isKnown(name)) {
      place.mistake(
          Phrases.quoted(name) + " is the name of another backend; choose one of its own");
    } else if (isNew(place, name)) {
      Optional<Field> settings = keys.optional("settings");
      if (settings.isPresent()) {
        settings.get().entries().forEach((key, field) -> readSetting(entry, key, field));
      } else if (!entry.isRenamed() && !Collections.disjoint(keys.present(), CHANGES)) {
        place.mistake(
            "options and threads need a name of their own",
            "for example: {name: " + name + "-2, backend: " + name + ", options: ...}",
            "or several under settings: {" + name + "-a: {...}, ...}");
      } else {
        add(place, entry, Observation.DEFAULT_SETTING, entry.common());
      }
    }
  }

  private Chosen common(Keys keys, Catalogue.Backend backend) {
    int threads = keys.optional(THREADS).map(this::threads).orElse(allowances.threads());
    Chosen plain = new Chosen(Map.of(), threads);
    return keys.optional("options").map(field -> chosen(field, backend, plain)).orElse(plain);
  }

  private void readSetting(Entry entry, String setting, Field field) {
    Chosen chosen = chosen(field, entry.backend(), entry.common());
    boolean isDefault = setting.equals(Observation.DEFAULT_SETTING);
    if (isDefault && !chosen.equals(entry.common())) {
      field.mistake("the setting 'default' has no options of its own; give it another name");
    } else if (isDefault && !entry.isRenamed() && !chosen.equals(unchanged())) {
      field.mistake("'default' under the backend's own name has no options; name the entry");
    } else if (field.isNamed(setting)) {
      add(field, entry, setting, chosen);
    }
  }

  private Chosen unchanged() {
    return new Chosen(Map.of(), allowances.threads());
  }

  /** An entry of the list: a backend under a name, and what all its settings share. */
  private record Entry(String name, Catalogue.Backend backend, Chosen common) {
    boolean isRenamed() {
      return !name.equals(backend.name());
    }
  }

  /** Options and threads as the file gives them. */
  private record Chosen(Map<String, String> options, int threads) {}

  private Chosen chosen(Field field, Catalogue.Backend backend, Chosen common) {
    Map<String, String> options = new LinkedHashMap<>(common.options());
    int threads = common.threads();
    List<String> known = new ArrayList<>(backend.options());
    known.add(THREADS);
    for (Map.Entry<String, Field> entry : field.entries(known).entrySet()) {
      if (entry.getKey().equals(THREADS)) {
        threads = threads(entry.getValue());
      } else {
        option(backend, entry.getKey(), entry.getValue())
            .ifPresent(text -> options.put(entry.getKey(), text));
      }
    }
    return new Chosen(options, threads);
  }

  private int threads(Field field) {
    return field.count(1, Allowances.MOST_THREADS).orElse(1);
  }

  private static Optional<String> option(Catalogue.Backend backend, String name, Field field) {
    Optional<Setting> setting =
        backend.settings().stream().filter(s -> s.name().equals(name)).findFirst();
    return setting.flatMap(
        s ->
            field.parsed(
                text -> {
                  String mistake = s.mistakeIn(text);
                  if (!mistake.isEmpty()) {
                    throw new IllegalArgumentException(mistake);
                  }
                  return text;
                }));
  }

  private Optional<Catalogue.Backend> backend(Field field, String name) {
    Optional<Catalogue.Backend> found = catalogue.backend(name);
    Optional<String> reason = catalogue.whyMissing(name);
    if (reason.isPresent()) {
      field.mistake("backend " + Phrases.quoted(name) + " cannot run here: " + reason.get());
    } else if (found.isEmpty()) {
      field.unknown("backend", name, catalogue.backends().stream().map(b -> b.name()).toList());
    }
    return found;
  }

  private boolean isKnown(String name) {
    return catalogue.backend(name).isPresent() || catalogue.whyMissing(name).isPresent();
  }

  private boolean isNew(Field place, String name) {
    if (names.add(name)) {
      return true;
    }
    place.mistake(
        Phrases.quoted(name) + " comes twice", "give each entry a name of its own, with name:");
    return false;
  }

  private void add(Field place, Entry entry, String setting, Chosen chosen) {
    Catalogue.Backend backend = entry.backend();
    SortedMap<String, String> options = new TreeMap<>();
    backend.settings().forEach(s -> options.put(s.name(), s.defaultText()));
    options.putAll(chosen.options());
    Builds.Build build;
    try {
      build = builds.of(backend, options);
    } catch (IllegalArgumentException e) {
      place.mistake(e.getMessage());
      return;
    }
    setups.add(
        new Setup(
            new BackendBuild(entry.name(), backend.name(), build.version(), build.code()),
            new steelyard.results.ledger.Setting(setting, options),
            chosen.threads(),
            allowances.of(entry.name(), backend)));
  }
}
