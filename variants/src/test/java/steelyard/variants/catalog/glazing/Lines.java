package steelyard.variants.catalog.glazing;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import steelyard.variants.family.InstanceSource;

/** Glazing lines from text and from the instances that are shipped. */
final class Lines {
  static final Path SHIPPED = Path.of("src/main/share/instances/glaze-line");

  private Lines() {}

  static GlazeLine read(Path folder, String... lines) {
    try {
      Path file = Files.write(folder.resolve("text"), List.of(lines));
      return GlazeLineReader.read(new InstanceSource("text", file));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static GlazeLine shipped(String name) {
    try {
      return GlazeLineReader.read(new InstanceSource(name, SHIPPED.resolve(name)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
