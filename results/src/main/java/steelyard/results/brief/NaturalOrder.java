package steelyard.results.brief;

import java.util.Comparator;

/** Orders names as people do: runs of digits by their number, so that la2 comes before la10. */
final class NaturalOrder implements Comparator<String> {

  static final NaturalOrder BY_NUMBER = new NaturalOrder();

  private NaturalOrder() {}

  @Override
  public int compare(String a, String b) {
    int i = 0;
    int j = 0;
    while (i < a.length() && j < b.length()) {
      int endA = end(a, i);
      int endB = end(b, j);
      int order = compareParts(a.substring(i, endA), b.substring(j, endB));
      if (order != 0) {
        return order;
      }
      i = endA;
      j = endB;
    }
    int rest = Integer.compare(a.length() - i, b.length() - j);
    return rest != 0 ? rest : a.compareTo(b);
  }

  /** The end of the run of digits, or of the single other character, that starts here. */
  private static int end(String s, int from) {
    int to = from;
    while (to < s.length() && digit(s.charAt(to))) {
      to++;
    }
    return Math.max(to, from + 1);
  }

  private static int compareParts(String a, String b) {
    if (!digit(a.charAt(0)) || !digit(b.charAt(0))) {
      return a.compareTo(b);
    }
    String x = stripZeros(a);
    String y = stripZeros(b);
    int byLength = Integer.compare(x.length(), y.length());
    return byLength != 0 ? byLength : x.compareTo(y);
  }

  private static String stripZeros(String digits) {
    int from = 0;
    while (from < digits.length() && digits.charAt(from) == '0') {
      from++;
    }
    return digits.substring(from);
  }

  private static boolean digit(char c) {
    return c >= '0' && c <= '9';
  }
}
