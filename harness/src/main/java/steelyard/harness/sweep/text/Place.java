package steelyard.harness.sweep.text;

import java.util.Objects;

/**
 * Where something stands in a file, printed as {@code file:line:column}.
 *
 * @param file as the person named it
 * @param line from 1; 0 for the file as a whole
 * @param column from 1; 0 for the line as a whole
 */
public record Place(String file, int line, int column) {
  public Place {
    Objects.requireNonNull(file, "file");
    if (line < 0 || column < 0 || (line == 0 && column > 0)) {
      throw new IllegalArgumentException("no such place: " + line + ":" + column);
    }
  }

  /** The file as a whole. */
  public static Place of(String file) {
    return new Place(file, 0, 0);
  }

  /** A line of this file as a whole. */
  public Place line(int number) {
    return new Place(file, number, 0);
  }

  @Override
  public String toString() {
    if (line == 0) {
      return file;
    }
    return column == 0 ? file + ":" + line : file + ":" + line + ":" + column;
  }
}
