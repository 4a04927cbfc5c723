package steelyard.adapters.spi;

import java.util.List;
import java.util.Objects;

/**
 * One option of a backend.
 *
 * @param defaultText the value where none is given, as it is written in a sweep file
 * @param low smallest value of a number; ignored otherwise
 * @param high largest value of a number; ignored otherwise
 * @param choices the words that a {@link Kind#CHOICE} takes; empty otherwise
 * @param help one phrase
 */
public record Setting(
    String name,
    Kind kind,
    String defaultText,
    double low,
    double high,
    List<String> choices,
    String help) {

  /** What values look like. */
  public enum Kind {
    SWITCH,
    INTEGER,
    REAL,
    CHOICE,
    /** A program and its arguments, with blanks between them. */
    COMMAND
  }

  public Setting {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(kind, "kind");
    Objects.requireNonNull(help, "help");
    choices = List.copyOf(choices);
    String mistake = mistakeIn(kind, defaultText, low, high, choices);
    if (!mistake.isEmpty()) {
      throw new IllegalArgumentException("default of " + name + ": " + mistake);
    }
  }

  /** true or false. */
  public static Setting flag(String name, boolean byDefault, String help) {
    return new Setting(name, Kind.SWITCH, Boolean.toString(byDefault), 0, 0, List.of(), help);
  }

  /** A whole number in {@code low..high}. */
  public static Setting integer(String name, long byDefault, long low, long high, String help) {
    return new Setting(name, Kind.INTEGER, Long.toString(byDefault), low, high, List.of(), help);
  }

  /** A number in {@code low..high}. */
  public static Setting real(String name, double byDefault, double low, double high, String help) {
    return new Setting(name, Kind.REAL, Double.toString(byDefault), low, high, List.of(), help);
  }

  /** One of the words; the first is the default. */
  public static Setting choice(String name, List<String> choices, String help) {
    return new Setting(name, Kind.CHOICE, choices.get(0), 0, 0, choices, help);
  }

  /** A program and its arguments. */
  public static Setting command(String name, String byDefault, String help) {
    return new Setting(name, Kind.COMMAND, byDefault, 0, 0, List.of(), help);
  }

  /** What is wrong with {@code text} as a value of this; empty if nothing is. */
  public String mistakeIn(String text) {
    return mistakeIn(kind, text, low, high, choices);
  }

  private static String mistakeIn(
      Kind kind, String text, double low, double high, List<String> choices) {
    return switch (kind) {
      case SWITCH ->
          text.equals("true") || text.equals("false") ? "" : "'" + text + "' is not true or false";
      case INTEGER -> numberMistake(text, low, high, "-?[0-9]{1,18}", "a whole number");
      case REAL ->
          numberMistake(text, low, high, "-?[0-9]+(\\.[0-9]+)?([eE]-?[0-9]+)?", "a number");
      case CHOICE ->
          choices.contains(text)
              ? ""
              : "'" + text + "' is not one of " + String.join(", ", choices);
      case COMMAND ->
          text.isBlank() || text.chars().anyMatch(Character::isISOControl)
              ? "a command is one line that is not blank"
              : "";
    };
  }

  private static String numberMistake(
      String text, double low, double high, String shape, String what) {
    if (!text.matches(shape)) {
      return "'" + text + "' is not " + what;
    }
    double value = Double.parseDouble(text);
    return value >= low && value <= high
        ? ""
        : text + " is not in " + plain(low) + ".." + plain(high);
  }

  private static String plain(double value) {
    return value == Math.rint(value) && Math.abs(value) < 1e18
        ? Long.toString((long) value)
        : Double.toString(value);
  }
}
