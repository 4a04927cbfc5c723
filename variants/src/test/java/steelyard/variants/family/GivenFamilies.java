package steelyard.variants.family;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.ServiceLoader;
import java.util.stream.Stream;

/** The families that are found, and their instances. */
final class GivenFamilies {
  static final Path SHARE = Path.of("src/main/share/instances");

  private GivenFamilies() {}

  /** A row of a family's table of instances. */
  record Listed(String path, List<String> sets) {}

  static Stream<Family<?>> all() {
    List<Family<?>> found = new ArrayList<>();
    for (Family<?> family : ServiceLoader.load(Family.class)) {
      found.add(family);
    }
    return found.stream();
  }

  static <T> Stream<T> thatAre(Class<T> kind) {
    return all().filter(kind::isInstance).map(kind::cast);
  }

  static Path folder(Family<?> family) {
    return SHARE.resolve(family.name());
  }

  static List<Listed> instances(Family<?> family) {
    try {
      List<Listed> listed = new ArrayList<>();
      for (String row : Files.readAllLines(folder(family).resolve("instances.csv"))) {
        List<String> cells = List.of(row.split(",", -1));
        listed.add(new Listed(cells.get(0), List.of(cells.get(1).split(";", -1))));
      }
      return listed.subList(1, listed.size());
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static <I> I read(Family<I> family, String path) {
    try {
      return family.read(new InstanceSource(path, folder(family).resolve(path)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static <I> I read(Family<I> family, String text, Path folder) {
    try {
      return family.read(
          new InstanceSource("text", Files.writeString(folder.resolve("text"), text)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
