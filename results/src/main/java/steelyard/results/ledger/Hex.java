package steelyard.results.ledger;

/** The spelling of bytes that keys and digests share. */
final class Hex {

  private Hex() {}

  /** Requires lowercase hexadecimal digits, two to the byte, so that equal bytes are equal text. */
  static void check(String what, String text, int leastBytes, int mostBytes) {
    int digits = Text.require(what, text).length();
    boolean spelled = digits % 2 == 0 && text.chars().allMatch(Hex::digit);
    if (!spelled || digits < 2 * leastBytes || digits > 2 * mostBytes) {
      throw new IllegalArgumentException(
          "%s must be %s lowercase hexadecimal digits, was '%s'"
              .formatted(what, range(2 * leastBytes, 2 * mostBytes), Text.head(text, 80)));
    }
  }

  private static boolean digit(int c) {
    return (c >= '0' && c <= '9') || (c >= 'a' && c <= 'f');
  }

  private static String range(int least, int most) {
    return least == most ? String.valueOf(least) : least + " to " + most;
  }
}
