package steelyard.variants.catalog.text;

import java.util.List;
import java.util.Objects;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;

/**
 * One line of an instance file.
 *
 * @param line counted from 1
 * @param words at least one
 */
public record Row(InstanceSource source, int line, List<String> words) {
  private static final Pattern NUMBER = Pattern.compile("[0-9]{1,10}");
  private static final int SHOWN = 20;

  public Row {
    Objects.requireNonNull(source, "source");
    words = List.copyOf(words);
  }

  public String first() {
    return words.get(0);
  }

  /** The words from {@code start} on as whole numbers. */
  public Ints numbersFrom(int start) {
    return Ints.of(IntStream.range(start, words.size()).map(this::number).toArray());
  }

  /** All words as whole numbers. */
  public Ints numbers() {
    return numbersFrom(0);
  }

  /**
   * Exactly so many whole numbers from {@code start} on.
   *
   * @param meant what they are, for the message
   * @throws InstanceException if there are more or fewer
   */
  public Ints numbersFrom(int start, int count, String meant) {
    if (words.size() - start != count) {
      int found = words.size() - start;
      throw mistake(
          found
              + (found == 1 ? " number" : " numbers")
              + " where "
              + count
              + " should stand: "
              + meant);
    }
    return numbersFrom(start);
  }

  private int number(int index) {
    String word = words.get(index);
    if (!NUMBER.matcher(word).matches() || Long.parseLong(word) > Domain.LIMIT) {
      throw mistake("'" + shown(word) + "' is not a whole number from 0 to 10^9");
    }
    return Integer.parseInt(word);
  }

  /** The word, cut where it is long. */
  public static String shown(String word) {
    return word.length() <= SHOWN ? word : word.substring(0, SHOWN) + "...";
  }

  /** What is wrong with this line. */
  public InstanceException mistake(String what) {
    return InstanceException.at(source, line, what);
  }
}
