package steelyard.adapters.sat.encoding;

import java.util.Objects;
import java.util.function.BooleanSupplier;

/**
 * When to give up encoding.
 *
 * @param variables no more than so many
 * @param clauses no more than so many
 * @param stop asked every few thousand clauses
 */
public record Limits(long variables, long clauses, BooleanSupplier stop) {
  /** Never; but variables are numbered by ints. */
  public static final Limits NONE = new Limits(Integer.MAX_VALUE - 1, Long.MAX_VALUE, () -> false);

  public Limits {
    Objects.requireNonNull(stop, "stop");
  }
}
