package steelyard.harness.worker;

import java.nio.file.Path;
import java.util.List;
import java.util.Objects;

/** Which model a worker is to make. A worker that does not know a kind refuses it by name. */
public sealed interface Subject {

  /**
   * A variant of a family on an instance.
   *
   * @param instance the instance's name within its family
   * @param path its file
   * @param amendments in any order; none for plain
   */
  record OfVariant(String family, String instance, Path path, List<String> amendments)
      implements Subject {
    public OfVariant {
      Objects.requireNonNull(family, "family");
      Objects.requireNonNull(instance, "instance");
      Objects.requireNonNull(path, "path");
      amendments = List.copyOf(amendments);
    }

    /** The plain model on the same instance. */
    public OfVariant plain() {
      return new OfVariant(family, instance, path, List.of());
    }
  }
}
