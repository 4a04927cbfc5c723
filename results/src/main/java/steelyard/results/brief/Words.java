package steelyard.results.brief;

import java.util.Locale;
import java.util.OptionalDouble;
import java.util.function.IntPredicate;
import steelyard.results.statistics.TimeRatio;

/**
 * How names and numbers are written for people, the same on every page and in every locale.
 *
 * <p>Names come from files and may hold anything: what cannot be seen, or would change what is seen
 * around it, is shown by its code point.
 */
public final class Words {

  private static final int LONGEST_NAME = 80;

  private Words() {}

  /** A name that can be shown: everything invisible made visible, at most 80 code points. */
  public static String name(String name) {
    return cut(visible(name), LONGEST_NAME);
  }

  /**
   * A text whose control characters, bidirectional marks, other invisible format characters and
   * halves of surrogate pairs are written as {@code [U+202E]}; an empty one says so.
   */
  public static String visible(String text) {
    return text.isEmpty() ? "(empty)" : visible(text, c -> false);
  }

  /** The same for a text of several lines, which keeps its line ends and tabs and may be empty. */
  public static String visibleLines(String text) {
    return visible(text, c -> c == '\n' || c == '\t');
  }

  private static String visible(String text, IntPredicate kept) {
    StringBuilder shown = new StringBuilder(text.length());
    text.codePoints()
        .forEach(
            c -> {
              if (hidden(c) && !kept.test(c)) {
                shown.append(String.format(Locale.ROOT, "[U+%04X]", c));
              } else {
                shown.appendCodePoint(c);
              }
            });
    return shown.toString();
  }

  private static boolean hidden(int codePoint) {
    return switch (Character.getType(codePoint)) {
      case Character.CONTROL,
          Character.FORMAT,
          Character.SURROGATE,
          Character.UNASSIGNED,
          Character.LINE_SEPARATOR,
          Character.PARAGRAPH_SEPARATOR ->
          true;
      default -> false;
    };
  }

  /**
   * A text of at most so many code points; a longer one ends in an ellipsis.
   *
   * @param width at least 1
   */
  public static String cut(String text, int width) {
    if (text.codePointCount(0, text.length()) <= width) {
      return text;
    }
    return text.substring(0, text.offsetByCodePoints(0, width - 1)) + "…";
  }

  /**
   * A text of at most so many code points; a longer one keeps both ends around an ellipsis, because
   * candidates often differ only there.
   *
   * @param width at least 3
   */
  public static String cutMiddle(String text, int width) {
    int length = text.codePointCount(0, text.length());
    if (length <= width) {
      return text;
    }
    int tail = (width - 1) / 2;
    int head = width - 1 - tail;
    return text.substring(0, text.offsetByCodePoints(0, head))
        + "…"
        + text.substring(text.offsetByCodePoints(0, length - tail));
  }

  /** Seconds to three significant digits, at most three decimals, without unit. */
  public static String seconds(double seconds) {
    if (seconds < 0.9995) {
      return format("%.3f", seconds);
    }
    if (seconds < 9.995) {
      return format("%.2f", seconds);
    }
    return format(seconds < 99.95 ? "%.1f" : "%.0f", seconds);
  }

  /** Seconds as above; a dash where there are none. */
  public static String seconds(OptionalDouble seconds) {
    return seconds.isPresent() ? seconds(seconds.getAsDouble()) : "–";
  }

  /** A count that may hold shares of instances: whole where it is, else two decimals. */
  public static String count(double count) {
    return count == Math.rint(count) ? format("%.0f", count) : format("%.2f", count);
  }

  /** A factor to about two significant digits, such as {@code 1.07×}, {@code 3.2×}, {@code 41×}. */
  public static String times(double factor) {
    if (factor < 1.995) {
      return format("%.2f×", factor);
    }
    return format(factor < 9.95 ? "%.1f×" : "%.0f×", factor);
  }

  /** A ratio with what is known of it, such as {@code ≥ 12×}. */
  public static String ratio(TimeRatio ratio) {
    return switch (ratio.kind()) {
      case EXACT -> times(ratio.value());
      case AT_LEAST -> "≥ " + times(ratio.value());
      case AT_MOST -> "≤ " + times(ratio.value());
    };
  }

  /** How many times faster a ratio below 1 means, such as {@code ≥ 12×}. */
  public static String speedup(TimeRatio ratio) {
    return switch (ratio.kind()) {
      case EXACT -> times(1 / ratio.value());
      case AT_LEAST -> "≤ " + times(1 / ratio.value());
      case AT_MOST -> "≥ " + times(1 / ratio.value());
    };
  }

  /** A count and its noun: {@code 1 run}, {@code 2 runs}. */
  public static String plural(long count, String noun) {
    return count + " " + noun + (count == 1 ? "" : "s");
  }

  /** A share as a percentage without needless zeros. */
  public static String percent(double share) {
    String oneDecimal = format("%.1f", share * 100);
    return (oneDecimal.endsWith(".0")
            ? oneDecimal.substring(0, oneDecimal.length() - 2)
            : oneDecimal)
        + " %";
  }

  /** A number without needless zeros: {@code 2}, {@code 0.05}. */
  public static String plain(double value) {
    return value == Math.rint(value) ? format("%.0f", value) : Double.toString(value);
  }

  private static String format(String pattern, double value) {
    return String.format(Locale.ROOT, pattern, value);
  }
}
