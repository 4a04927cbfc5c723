package steelyard.harness.sweep;

import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.regex.Pattern;
import steelyard.harness.sweep.text.Field;

/**
 * Jars with families that somebody named, by alias; those without one under the empty text. The
 * jars of one alias are one version of a family and what it needs beside; versions never see each
 * other.
 */
public record FamilyJars(SortedMap<String, List<Path>> byAlias) {
  private static final Pattern ALIAS = Pattern.compile("[A-Za-z0-9][A-Za-z0-9._-]{0,63}");

  public FamilyJars {
    SortedMap<String, List<Path>> copy = new TreeMap<>();
    byAlias.forEach((alias, jars) -> copy.put(alias, List.copyOf(jars)));
    byAlias = Collections.unmodifiableSortedMap(copy);
  }

  /** None. */
  public static FamilyJars none() {
    return new FamilyJars(new TreeMap<>());
  }

  /**
   * From a command line.
   *
   * @param options each {@code JAR} or {@code ALIAS=JAR}
   */
  public static FamilyJars of(List<String> options) {
    SortedMap<String, List<Path>> jars = new TreeMap<>();
    for (String option : options) {
      int equals = option.indexOf('=');
      boolean named =
          equals > 0
              && ALIAS.matcher(option.substring(0, equals)).matches()
              && !Files.exists(Path.of(option));
      String alias = named ? option.substring(0, equals) : "";
      Path jar = Path.of(named ? option.substring(equals + 1) : option);
      jars.computeIfAbsent(alias, a -> new ArrayList<>()).add(jar.toAbsolutePath());
    }
    return new FamilyJars(jars);
  }

  /**
   * What a sweep file says: a path, a list of paths, or paths and lists of paths by alias.
   *
   * @param base the folder that relative paths start from
   */
  static FamilyJars read(Field field, Path base) {
    SortedMap<String, List<Path>> jars = new TreeMap<>();
    if (field.hasKeys()) {
      for (Map.Entry<String, Field> entry : field.entries().entrySet()) {
        if (entry.getValue().isNamed(entry.getKey())) {
          jars.put(entry.getKey(), paths(entry.getValue(), base));
        }
      }
    } else {
      jars.put("", paths(field, base));
    }
    return new FamilyJars(jars);
  }

  private static List<Path> paths(Field field, Path base) {
    List<Path> paths = new ArrayList<>();
    for (Field item : field.itemsOrAlone()) {
      item.text().ifPresent(text -> addTo(paths, item, text, base));
    }
    return paths;
  }

  private static void addTo(List<Path> paths, Field item, String text, Path base) {
    try {
      Path path = base.resolve(text).normalize();
      if (Files.isReadable(path)) {
        paths.add(path);
      } else {
        item.mistake("there is no jar " + path);
      }
    } catch (InvalidPathException e) {
      item.mistake("no path: " + e.getReason());
    }
  }

  /** Those of this and of another; where both name an alias, the other's. */
  public FamilyJars with(FamilyJars other) {
    SortedMap<String, List<Path>> both = new TreeMap<>(byAlias);
    both.putAll(other.byAlias);
    return new FamilyJars(both);
  }
}
