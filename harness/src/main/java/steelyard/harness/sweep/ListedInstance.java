package steelyard.harness.sweep;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import steelyard.harness.sweep.text.Place;

/**
 * An instance whose content nobody has read yet.
 *
 * @param name its path within the folder, without the extension
 * @param place where it is listed
 */
record ListedInstance(
    String name,
    Path path,
    Place place,
    List<String> sets,
    String instanceClass,
    double weight,
    Optional<LocalDate> date,
    OptionalLong known) {

  static ListedInstance of(Path folder, Path file, Place place) {
    return new ListedInstance(
        nameOf(folder.relativize(file)),
        file,
        place,
        List.of(),
        Instance.NO_CLASS,
        1,
        Optional.empty(),
        OptionalLong.empty());
  }

  ListedInstance withLabels(List<String> newSets, String newClass) {
    return new ListedInstance(name, path, place, newSets, newClass, weight, date, known);
  }

  ListedInstance withFacts(double newWeight, Optional<LocalDate> newDate, OptionalLong newKnown) {
    return new ListedInstance(name, path, place, sets, instanceClass, newWeight, newDate, newKnown);
  }

  /** The path with slashes, without an extension that starts with a letter. */
  private static String nameOf(Path relative) {
    String name = relative.toString().replace(relative.getFileSystem().getSeparator(), "/");
    int dot = name.lastIndexOf('.');
    boolean extended =
        dot > name.lastIndexOf('/') + 1
            && dot + 1 < name.length()
            && Character.isLetter(name.charAt(dot + 1));
    return extended ? name.substring(0, dot) : name;
  }
}
