package steelyard.harness.worker;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.Iterator;
import java.util.List;
import java.util.NoSuchElementException;
import java.util.ServiceConfigurationError;
import java.util.ServiceLoader;
import java.util.function.Function;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import steelyard.adapters.spi.Backend;
import steelyard.variants.family.Family;

/** The families and backends on this worker's class path. */
final class Registry {
  private Registry() {}

  /** A provider that could not be made. */
  record Broken(String reason) {}

  /** What was found. */
  record Found<T>(List<T> working, List<Broken> broken) {}

  static Found<Backend> backends() {
    return load(Backend.class, backend -> backend.describe().name());
  }

  static Found<Family<?>> families() {
    Found<Family<?>> found = new Found<>(new ArrayList<>(), new ArrayList<>());
    @SuppressWarnings("rawtypes")
    Found<Family> raw = load(Family.class, Family::name);
    raw.working().forEach(found.working()::add);
    found.broken().addAll(raw.broken());
    return found;
  }

  private static <T> Found<T> load(Class<T> type, Function<T, String> name) {
    List<T> working = new ArrayList<>();
    List<Broken> broken = new ArrayList<>();
    Iterator<T> providers = ServiceLoader.load(type).iterator();
    while (true) {
      try {
        working.add(providers.next());
      } catch (NoSuchElementException e) {
        working.sort(Comparator.comparing(name));
        return new Found<>(working, broken);
      } catch (ServiceConfigurationError e) {
        broken.add(new Broken(reason(e)));
      }
    }
  }

  private static String reason(ServiceConfigurationError e) {
    return e.getCause() == null ? e.getMessage() : e.getMessage() + ": " + e.getCause();
  }

  static Backend backend(String name) {
    Found<Backend> found = backends();
    return found.working().stream()
        .filter(backend -> backend.describe().name().equals(name))
        .findFirst()
        .orElseThrow(
            () ->
                missing(
                    "backend",
                    name,
                    found.working().stream().map(b -> b.describe().name()),
                    found.broken()));
  }

  static Family<?> family(String name) {
    Found<Family<?>> found = families();
    return found.working().stream()
        .filter(family -> family.name().equals(name))
        .findFirst()
        .orElseThrow(
            () ->
                missing(
                    "family", name, found.working().stream().map(Family::name), found.broken()));
  }

  private static WorkerException missing(
      String kind, String name, Stream<String> known, List<Broken> broken) {
    String list = known.collect(Collectors.joining(", "));
    String rest = broken.isEmpty() ? "" : "; could not be loaded: " + broken.get(0).reason();
    return new WorkerException(
        Event.Failure.Kind.BAD_INPUT, "unknown " + kind + " '" + name + "'; known: " + list + rest);
  }
}
