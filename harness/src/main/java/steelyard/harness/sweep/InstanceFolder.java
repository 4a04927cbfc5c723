package steelyard.harness.sweep;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collection;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import steelyard.harness.sweep.text.Mistakes;
import steelyard.harness.sweep.text.Phrases;
import steelyard.harness.sweep.text.Place;
import steelyard.harness.sweep.text.SweepProblem;
import steelyard.harness.sweep.text.Utf8;

/**
 * Which instances does a folder hold?
 *
 * <p>Those that its {@code instances.csv} lists. Without that file, every file that lies in the
 * folder itself, but hidden ones and those that are there to be read: {@code *.md}, {@code *.csv},
 * {@code README*}, {@code LICENSE*}.
 */
final class InstanceFolder {

  private static final String INDEX = "instances.csv";
  private static final int LARGEST_INDEX = 16_000_000;

  private InstanceFolder() {}

  /**
   * The folder's instances, sorted by name, which are unique.
   *
   * @param shown the folder's name in messages
   * @throws SweepProblem if the index cannot be read at all
   * @throws UncheckedIOException if the folder cannot be listed
   */
  static List<ListedInstance> read(Path folder, String shown, Mistakes mistakes) {
    Path index = folder.resolve(INDEX);
    String shownIndex = Path.of(shown).resolve(INDEX).toString();
    List<ListedInstance> instances =
        Files.exists(index)
            ? new InstanceIndex(folder, shownIndex, mistakes)
                .read(Utf8.read(index, shownIndex, LARGEST_INDEX))
            : files(folder, Place.of(shown));
    return named(instances, mistakes).stream()
        .sorted(Comparator.comparing(ListedInstance::name))
        .toList();
  }

  private static List<ListedInstance> files(Path folder, Place place) {
    try (Stream<Path> files = Files.list(folder)) {
      return files
          .filter(Files::isRegularFile)
          .filter(file -> isData(file.getFileName().toString()))
          .sorted()
          .map(file -> ListedInstance.of(folder, file, place))
          .toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static boolean isData(String file) {
    return !file.startsWith(".")
        && !file.startsWith("README")
        && !file.startsWith("LICENSE")
        && !file.endsWith(".md")
        && !file.endsWith(".csv");
  }

  /** Those with good names of their own. */
  private static Collection<ListedInstance> named(
      List<ListedInstance> instances, Mistakes mistakes) {
    Map<String, ListedInstance> byName = new LinkedHashMap<>();
    for (ListedInstance instance : instances) {
      String name = Phrases.quoted(instance.name());
      if (instance.name().chars().anyMatch(Character::isISOControl)) {
        mistakes.add(instance.place(), "path", "a control character in the name " + name);
        continue;
      }
      ListedInstance first = byName.putIfAbsent(instance.name(), instance);
      if (first != null) {
        String files = first.path().getFileName() + " and " + instance.path().getFileName();
        mistakes.add(instance.place(), "path", "two files give the name " + name + ": " + files);
      }
    }
    return byName.values();
  }
}
