package steelyard.harness.sweep.text;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import org.apache.commons.text.similarity.LevenshteinDistance;

/** Words and phrases that messages share. */
public final class Phrases {

  private static final int LONGEST_QUOTE = 60;
  private static final int LISTED = 12;

  private Phrases() {}

  /** The text in quotes, on one line, cut where it is long. */
  public static String quoted(String text) {
    StringBuilder shown = new StringBuilder("'");
    text.codePoints()
        .limit(LONGEST_QUOTE)
        .forEach(c -> shown.appendCodePoint(Character.isISOControl(c) ? ' ' : c));
    if (text.codePointCount(0, text.length()) > LONGEST_QUOTE) {
      shown.append("...");
    }
    return shown.append("'").toString();
  }

  /** {@code unknown backend 'cpsatt' (did you mean 'cpsat'?)}. */
  public static String unknown(String kind, String found, Collection<String> known) {
    String meant = nearest(found, known).map(n -> " (did you mean " + quoted(n) + "?)").orElse("");
    return "unknown " + kind + " " + quoted(found) + meant;
  }

  /** {@code known: cpsat, engine, sat}, in the order given, cut where there are many. */
  public static String known(Collection<String> known) {
    if (known.isEmpty()) {
      return "known: none";
    }
    String first = known.stream().limit(LISTED).collect(Collectors.joining(", "));
    int more = known.size() - LISTED;
    return "known: " + first + (more > 0 ? " and " + more + " more" : "");
  }

  /**
   * The name that was probably meant.
   *
   * <p>The nearest by edit distance, case aside, if it is no farther than a third of the word, and
   * never more than two edits for a short one; the first of equals.
   *
   * @see <a href="https://en.wikipedia.org/wiki/Levenshtein_distance">Levenshtein (1966), Binary
   *     codes capable of correcting deletions, insertions, and reversals</a>
   */
  public static Optional<String> nearest(String found, Collection<String> known) {
    String lower = found.toLowerCase(Locale.ROOT);
    int most = Math.max(found.length() < 4 ? 1 : 2, found.length() / 3);
    LevenshteinDistance distance = new LevenshteinDistance(most);
    record Near(String name, int edits) {}
    List<Near> near =
        known.stream()
            .map(name -> new Near(name, distance.apply(lower, name.toLowerCase(Locale.ROOT))))
            .filter(n -> n.edits() >= 0)
            .toList();
    return near.stream().min(Comparator.comparingInt(Near::edits)).map(Near::name);
  }

  /** {@code 1 run} or {@code 2 runs}. */
  public static String count(long number, String noun) {
    return number + " " + noun + (number == 1 ? "" : "s");
  }
}
