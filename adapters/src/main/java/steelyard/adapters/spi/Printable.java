package steelyard.adapters.spi;

import java.io.IOException;
import java.util.SortedSet;

/** Can write what it made in the open format of its world. */
public interface Printable extends Facet {
  /** Names of the formats, such as {@code dimacs}. */
  SortedSet<String> formats();

  /**
   * Writes the lowered model.
   *
   * @throws IllegalArgumentException if the format is not one of {@link #formats()}
   */
  void print(String format, Appendable to) throws IOException;
}
