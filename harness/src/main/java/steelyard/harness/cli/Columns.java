package steelyard.harness.cli;

import java.io.PrintWriter;
import java.util.Locale;
import steelyard.adapters.spi.Setting;

/** Text for a terminal of 80 columns. */
final class Columns {
  private static final int WIDTH = 80;

  private Columns() {}

  /** Prints words on as many lines as they need, each after the indent. */
  static void wrapped(PrintWriter out, String indent, String text) {
    StringBuilder line = new StringBuilder(indent);
    for (String word : text.strip().split("\\s+", -1)) {
      if (line.length() > indent.length() && line.length() + 1 + word.length() > WIDTH) {
        out.println(line);
        line = new StringBuilder(indent);
      }
      line.append(line.length() > indent.length() ? " " : "").append(word);
    }
    out.println(line);
  }

  /** The range of a number. */
  static String range(Setting setting, boolean whole) {
    return whole
        ? (long) setting.low() + ".." + (long) setting.high()
        : setting.low() + ".." + setting.high();
  }

  /** A duration in the unit that suits it. */
  static String duration(double seconds) {
    if (seconds < 100) {
      return String.format(Locale.ROOT, "%.0f s", seconds);
    }
    double minutes = seconds / 60;
    return minutes < 100
        ? String.format(Locale.ROOT, "%.0f min", minutes)
        : String.format(Locale.ROOT, "%.1f h", minutes / 60);
  }

  /** Text that is shown as it is: control characters could drive the terminal. */
  static String visible(String text) {
    StringBuilder shown = new StringBuilder();
    text.codePoints()
        .forEach(
            c -> {
              boolean hides = Character.isISOControl(c) || Character.getType(c) == Character.FORMAT;
              shown.appendCodePoint(hides && c != '\n' ? 0xFFFD : c);
            });
    return shown.toString();
  }
}
