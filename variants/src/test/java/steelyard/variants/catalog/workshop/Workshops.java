package steelyard.variants.catalog.workshop;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import steelyard.variants.family.InstanceSource;

/** Workshops from text and from the instances that are shipped. */
final class Workshops {
  static final Path SHIPPED = Path.of("src/main/share/instances/workshop");

  private Workshops() {}

  static Workshop read(Path folder, String... lines) {
    try {
      Path file = Files.write(folder.resolve("text"), List.of(lines));
      return WorkshopReader.read(new InstanceSource("text", file));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Workshop shipped(String name) {
    try {
      return WorkshopReader.read(new InstanceSource(name, SHIPPED.resolve(name)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
