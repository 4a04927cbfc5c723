package steelyard.variants.catalog.dispatch;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import steelyard.variants.family.InstanceSource;

/** Days from text and from the instances that are shipped. */
final class Days {
  static final Path SHIPPED = Path.of("src/main/share/instances/dispatch");

  private Days() {}

  static Dispatch read(Path folder, String... lines) {
    try {
      Path file = Files.write(folder.resolve("text"), List.of(lines));
      return DispatchReader.read(new InstanceSource("text", file));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static Dispatch shipped(String name) {
    try {
      return DispatchReader.read(new InstanceSource(name, SHIPPED.resolve(name)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
