package steelyard.results.brief;

import java.util.regex.Pattern;

/** Words of a command as a POSIX shell must be given them (IEEE 1003.1, section 2.2). */
final class Shell {

  private static final Pattern PLAIN = Pattern.compile("[A-Za-z0-9_./:=@%+,-]+");

  private Shell() {}

  /** The word itself where it is harmless, else within single quotes. */
  static String quoted(String word) {
    return PLAIN.matcher(word).matches() ? word : "'" + word.replace("'", "'\\''") + "'";
  }
}
