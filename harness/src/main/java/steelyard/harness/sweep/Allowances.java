package steelyard.harness.sweep;

import java.time.Duration;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Phrases;
import steelyard.harness.sweep.text.Quantities;
import steelyard.results.ledger.Limits;

/**
 * Reads {@code limits}: what each run is allowed.
 *
 * <p>A sweep is limited by wall time or by work. Work is an amount for each backend in a unit of
 * its own, and the wall limit is then only the safety net.
 */
final class Allowances {

  /** The wall limit where none is given. */
  static final double WALL_SECONDS = 60;

  /** The safety net of a work limit where no wall limit is given. */
  static final double NET_SECONDS = 600;

  /** What reading an instance and building its model may take where nothing is said. */
  static final Duration BUILD = Duration.ofSeconds(60);

  /** The memory limit where none is given. */
  static final long MEMORY_BYTES = 2_000_000_000L;

  /** No machine has more cores than this to give to one solver. */
  static final int MOST_THREADS = 1024;

  private static final List<String> KEYS = List.of("wall", "work", "memory", "threads", "build");

  private final double wallSeconds;
  private final long memoryBytes;
  private final int threads;
  private final Duration build;
  private final Optional<Field> work;
  private final Map<String, Field> workByName;
  private final Set<String> workUsed = new HashSet<>();
  private final Map<String, Optional<Limits.Work>> amounts = new HashMap<>();

  private Allowances(Optional<Keys> keys) {
    work = keys.flatMap(k -> k.optional("work"));
    workByName = work.isPresent() && !work.get().isSingle() ? work.get().entries() : Map.of();
    wallSeconds =
        keys.flatMap(k -> k.optional("wall"))
            .flatMap(f -> f.parsed(Quantities::seconds))
            .orElse(work.isPresent() ? NET_SECONDS : WALL_SECONDS);
    memoryBytes =
        keys.flatMap(k -> k.optional("memory"))
            .flatMap(f -> f.parsed(Quantities::bytes))
            .orElse(MEMORY_BYTES);
    threads =
        keys.flatMap(k -> k.optional("threads"))
            .map(f -> f.count(1, MOST_THREADS).orElse(1))
            .orElse(1);
    build =
        keys.flatMap(k -> k.optional("build"))
            .flatMap(f -> f.parsed(Quantities::seconds))
            .map(seconds -> Duration.ofNanos((long) (seconds * 1e9)))
            .orElse(BUILD);
  }

  /** What the field says; the defaults where there is none. */
  static Allowances read(Optional<Field> limits) {
    return new Allowances(limits.map(f -> Keys.of(f, KEYS)));
  }

  /** The threads of a setting that says nothing of them. */
  int threads() {
    return threads;
  }

  /** What reading an instance and building its model may take. */
  Duration build() {
    return build;
  }

  /** What a run on this backend is allowed; a missing amount of work is a mistake. */
  Limits of(String name, Catalogue.Backend backend) {
    Optional<Limits.Work> amount =
        amounts.computeIfAbsent(name, n -> work.flatMap(w -> amount(w, n, backend)));
    return new Limits(wallSeconds, amount, memoryBytes);
  }

  private Optional<Limits.Work> amount(Field all, String name, Catalogue.Backend backend) {
    String key = workByName.containsKey(name) ? name : backend.name();
    Field field = all.isSingle() ? all : workByName.get(key);
    if (field == null) {
      if (!all.hasKeys()) {
        return Optional.empty();
      }
      all.mistake(
          "no amount for " + Phrases.quoted(name),
          "a sweep limits every backend by work or none; its units: " + units(backend));
      return Optional.empty();
    }
    workUsed.add(key);
    if (backend.workUnits().isEmpty()) {
      field.mistake(Phrases.quoted(name) + " cannot be limited by work");
      return Optional.empty();
    }
    return field
        .parsed(text -> Quantities.amount(text, backend.workUnits()))
        .map(m -> new Limits.Work(m.unit(), m.amount().doubleValue()));
  }

  private static String units(Catalogue.Backend backend) {
    return backend.workUnits().isEmpty() ? "none" : String.join(", ", backend.workUnits());
  }

  /** Notes amounts of work for backends that the sweep does not have. */
  void noteUnused(List<String> names) {
    workByName.forEach(
        (key, field) -> {
          if (!workUsed.contains(key)) {
            field.mistakeInKey(
                Phrases.unknown("backend", key, names),
                "in this sweep: " + String.join(", ", names));
          }
        });
  }
}
