package steelyard.harness.sweep;

import java.io.IOException;
import java.io.InputStream;
import java.io.OutputStream;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.security.DigestInputStream;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import java.util.regex.Pattern;
import steelyard.harness.sweep.text.Field;
import steelyard.harness.sweep.text.Keys;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;
import steelyard.results.ledger.Digest;

/**
 * Reads {@code instances}: names or patterns among those that the family ships, or selections by
 * folder, set, class and name.
 *
 * <p>The keys of a selection narrow it, the items of a list widen it. Every word must find
 * something.
 */
final class InstancesReader {

  private static final List<String> KEYS = List.of("folder", "set", "class", "names");
  private static final int MOST = 20_000;

  private final Path base;
  private final Catalogue.Family family;
  private final Mistakes mistakes;
  private final Map<String, ListedInstance> selected = new LinkedHashMap<>();
  private final Map<Path, List<ListedInstance>> folders = new HashMap<>();

  /**
   * A reader for one family.
   *
   * @param base the folder that relative paths start from
   */
  InstancesReader(Path base, Catalogue.Family family, Mistakes mistakes) {
    this.base = base;
    this.family = family;
    this.mistakes = mistakes;
  }

  /**
   * The selected instances, each once; none if the file has mistakes by now.
   *
   * @param instances what the file says; all that the family ships if it says nothing
   * @param whole where to note what is wrong if it says nothing
   */
  List<Instance> read(Optional<Field> instances, Field whole) {
    Field field = instances.orElse(whole);
    try {
      if (instances.isEmpty()) {
        select(field, shipped(field));
      } else {
        field.itemsOrAlone().forEach(this::readItem);
      }
      if (selected.size() > MOST) {
        field.mistake(selected.size() + " instances; at most " + MOST);
      }
      return mistakes.count() == 0
          ? selected.values().stream().map(InstancesReader::withContent).toList()
          : List.of();
    } catch (UncheckedIOException e) {
      field.mistake("instances cannot be read: " + e.getCause().getMessage());
      return List.of();
    }
  }

  private void readItem(Field item) {
    if (item.isSingle()) {
      select(item, byName(shipped(item), List.of(item)));
    } else {
      readSelection(item);
    }
  }

  private void readSelection(Field item) {
    Keys keys = Keys.of(item, KEYS);
    List<ListedInstance> found =
        keys.optional("folder").map(this::folder).orElseGet(() -> shipped(item));
    found = byLabel(found, keys.optional("set"), "set", ListedInstance::sets);
    found = byLabel(found, keys.optional("class"), "class", i -> List.of(i.instanceClass()));
    Optional<Field> names = keys.optional("names");
    if (names.isPresent()) {
      found = byName(found, names.get().itemsOrAlone());
    }
    select(item, found);
  }

  private void select(Field place, List<ListedInstance> instances) {
    for (ListedInstance instance : instances) {
      ListedInstance first = selected.putIfAbsent(instance.name(), instance);
      if (first != null && !first.path().equals(instance.path())) {
        place.mistake("two instances are named " + Phrases.quoted(instance.name()));
      }
    }
  }

  private List<ListedInstance> shipped(Field place) {
    if (family.instances().isEmpty()) {
      place.mistake(
          "family " + Phrases.quoted(family.name()) + " ships no instances",
          "give a folder, for example: instances: {folder: data}");
      return List.of();
    }
    Path folder = family.instances().get().toAbsolutePath().normalize();
    return list(place, folder, folder.toString());
  }

  private List<ListedInstance> folder(Field field) {
    return field
        .parsed(
            text -> {
              try {
                return base.resolve(text).normalize();
              } catch (InvalidPathException e) {
                throw new IllegalArgumentException(Phrases.quoted(text) + " is no path", e);
              }
            })
        .map(folder -> list(field, folder, field.text().orElse("")))
        .orElse(List.of());
  }

  private List<ListedInstance> list(Field place, Path folder, String shown) {
    if (!Files.isDirectory(folder)) {
      place.mistake("no such folder: " + folder);
      return List.of();
    }
    List<ListedInstance> known = folders.get(folder);
    if (known == null) {
      int before = mistakes.count();
      known = InstanceFolder.read(folder, shown, mistakes);
      folders.put(folder, known);
      if (known.isEmpty() && mistakes.count() == before) {
        place.mistake("no instances in " + folder);
      }
    }
    return known;
  }

  private static List<ListedInstance> byLabel(
      List<ListedInstance> from,
      Optional<Field> wanted,
      String kind,
      Function<ListedInstance, List<String>> labelsOf) {
    if (wanted.isEmpty() || from.isEmpty()) {
      return from;
    }
    List<String> known =
        from.stream().flatMap(i -> labelsOf.apply(i).stream()).distinct().sorted().toList();
    Set<String> labels = new LinkedHashSet<>();
    for (Field item : wanted.get().itemsOrAlone()) {
      Optional<String> text = item.text();
      if (text.isPresent() && !known.contains(text.get())) {
        item.unknown(kind, text.get(), known);
      }
      text.ifPresent(labels::add);
    }
    return from.stream().filter(i -> !Collections.disjoint(labels, labelsOf.apply(i))).toList();
  }

  private static List<ListedInstance> byName(List<ListedInstance> from, List<Field> patterns) {
    List<ListedInstance> kept = new ArrayList<>();
    for (Field field : patterns) {
      Optional<String> text = field.text();
      Pattern pattern = pattern(text.orElse(""));
      List<ListedInstance> matches =
          from.stream().filter(i -> pattern.matcher(i.name()).matches()).toList();
      if (matches.isEmpty() && !from.isEmpty() && text.isPresent()) {
        notFound(field, text.get(), from.stream().map(ListedInstance::name).toList());
      }
      kept.addAll(matches);
    }
    return kept.stream().distinct().toList();
  }

  private static void notFound(Field field, String name, List<String> known) {
    if (name.contains("*") || name.contains("?")) {
      field.mistake("no instance matches " + Phrases.quoted(name), Phrases.known(known));
    } else {
      field.unknown("instance", name, known);
    }
  }

  /** A name in which {@code *} is any text and {@code ?} any one character. */
  private static Pattern pattern(String name) {
    StringBuilder regex = new StringBuilder();
    name.codePoints()
        .forEach(
            c -> {
              switch (c) {
                case '*' -> regex.append(".*");
                case '?' -> regex.append('.');
                default -> regex.append(Pattern.quote(Character.toString(c)));
              }
            });
    return Pattern.compile(regex.toString());
  }

  private static Instance withContent(ListedInstance listed) {
    try {
      return new Instance(
          listed.name(),
          listed.path().toAbsolutePath(),
          sha256(listed.path()),
          Files.size(listed.path()),
          listed.sets(),
          listed.instanceClass(),
          listed.weight(),
          listed.date(),
          listed.known());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Digest sha256(Path file) throws IOException {
    try {
      MessageDigest sha = MessageDigest.getInstance("SHA-256");
      try (InputStream in = new DigestInputStream(Files.newInputStream(file), sha)) {
        in.transferTo(OutputStream.nullOutputStream());
      }
      return Digest.of(sha.digest());
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
