package steelyard.variants.catalog.text;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Pattern;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;

/**
 * The lines of an instance file that say something, one after the other: lines that start with
 * {@code #} and empty ones are left out, words are parted by blanks.
 */
public final class Rows {
  private static final Pattern BLANKS = Pattern.compile("\\s+");

  private final InstanceSource source;
  private final List<Row> rows = new ArrayList<>();
  private final int lastLine;
  private int next;

  private Rows(InstanceSource source, List<String> lines) {
    this.source = source;
    this.lastLine = Math.max(1, lines.size());
    for (int i = 0; i < lines.size(); i++) {
      String text = lines.get(i).strip();
      if (!text.isEmpty() && !text.startsWith("#")) {
        rows.add(new Row(source, i + 1, BLANKS.splitAsStream(text).toList()));
      }
    }
  }

  /**
   * The rows of {@code source}.
   *
   * @throws InstanceException if it is not UTF-8 text
   */
  public static Rows of(InstanceSource source) throws IOException {
    return new Rows(source, source.lines());
  }

  public boolean hasNext() {
    return next < rows.size();
  }

  /**
   * The next row.
   *
   * @param meant what should stand there, for the message
   * @throws InstanceException if the file has no more
   */
  public Row next(String meant) {
    if (!hasNext()) {
      String found = rows.isEmpty() ? "no instance here" : "the file ends too soon";
      throw InstanceException.at(source, lastLine, found + "; here should stand " + meant);
    }
    return rows.get(next++);
  }

  /** What is wrong with the file as a whole. */
  public InstanceException mistake(String what) {
    return new InstanceException(source.name() + ": " + what);
  }
}
