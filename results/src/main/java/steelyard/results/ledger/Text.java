package steelyard.results.ledger;

import java.util.regex.Pattern;

/** Checks and cuts of the text that records carry. */
final class Text {

  private static final String CUT = "…";
  private static final Pattern ID = Pattern.compile("[0-9a-z][0-9a-z-]{3,63}");

  private Text() {}

  /** Requires a text at all; the message names what is missing, as a reader of JSON needs it. */
  static <T> T require(String what, T value) {
    if (value == null) {
      throw new IllegalArgumentException(what + " is missing");
    }
    return value;
  }

  /** Requires a name that can be stored, shown on a line and told from every other. */
  static void requireName(String what, String value) {
    if (require(what, value).isBlank()) {
      throw new IllegalArgumentException(what + " must not be empty");
    }
    if (value.codePoints().anyMatch(Text::unprintable)) {
      throw new IllegalArgumentException(
          "%s must be printable on one line, was '%s'".formatted(what, head(value, 80)));
    }
  }

  private static boolean unprintable(int codePoint) {
    return switch (Character.getType(codePoint)) {
      case Character.CONTROL,
          Character.SURROGATE, // half of a pair, which no encoding can write
          Character.LINE_SEPARATOR,
          Character.PARAGRAPH_SEPARATOR ->
          true;
      default -> false;
    };
  }

  /** Requires an id that is also a safe folder name on every file system. */
  static void requireId(String what, String value) {
    if (!ID.matcher(require(what, value)).matches()) {
      throw new IllegalArgumentException(
          "%s must be 4 to 64 lowercase letters, digits and inner '-', was '%s'"
              .formatted(what, head(value, 80)));
    }
  }

  /** The first characters, with a mark where something was cut; never half of a pair. */
  static String head(String text, int most) {
    if (text.length() <= most) {
      return text;
    }
    int end = most - CUT.length();
    return text.substring(0, splitsPair(text, end) ? end - 1 : end) + CUT;
  }

  /** The last characters, with a mark where something was cut; never half of a pair. */
  static String tail(String text, int most) {
    if (text.length() <= most) {
      return text;
    }
    int start = text.length() - most + CUT.length();
    return CUT + text.substring(splitsPair(text, start) ? start + 1 : start);
  }

  private static boolean splitsPair(String text, int at) {
    return at > 0
        && Character.isHighSurrogate(text.charAt(at - 1))
        && Character.isLowSurrogate(text.charAt(at));
  }
}
