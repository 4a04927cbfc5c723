package steelyard.harness.sweep;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalLong;
import steelyard.results.ledger.Digest;
import steelyard.results.ledger.Recipe;

/**
 * One data file of a family.
 *
 * @param name its path within its folder, without the extension
 * @param path where it lies, absolute
 * @param content digest of its bytes
 * @param bytes how large it is
 * @param sets the sets that it belongs to
 * @param instanceClass its class; {@code "-"} for none
 * @param weight its weight in production, positive and finite
 * @param date the day that it is from
 * @param known the best objective known
 */
public record Instance(
    String name,
    Path path,
    Digest content,
    long bytes,
    List<String> sets,
    String instanceClass,
    double weight,
    Optional<LocalDate> date,
    OptionalLong known) {

  /** The class of an instance that has none. */
  public static final String NO_CLASS = "-";

  public Instance {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(path, "path");
    Objects.requireNonNull(content, "content");
    sets = List.copyOf(sets);
    Objects.requireNonNull(instanceClass, "instanceClass");
    Objects.requireNonNull(date, "date");
    Objects.requireNonNull(known, "known");
    if (!(weight > 0) || Double.isInfinite(weight)) {
      throw new IllegalArgumentException("weight must be positive and finite, was " + weight);
    }
  }

  /** What a run's recipe says of it. */
  public Recipe.Instance forRecipe() {
    return new Recipe.Instance(name, path.toString(), content, instanceClass, weight);
  }
}
