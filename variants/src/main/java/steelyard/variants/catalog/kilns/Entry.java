package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.model.Ints;

/**
 * One line of a file: a keyword, a name, then fields, each a word and its value.
 *
 * <pre>{@code
 * kiln A shelves 10 wide 4 hottest 3
 * }</pre>
 *
 * @param line counted from 1
 * @param fields in the line's order
 */
record Entry(
    InstanceSource source, int line, String keyword, String name, Map<String, String> fields) {
  private static final Pattern BLANKS = Pattern.compile("\\s+");
  private static final Pattern COMMA = Pattern.compile(",");
  private static final Pattern NAME = Pattern.compile("[A-Za-z][A-Za-z0-9-]{0,11}");
  private static final Pattern NUMBER = Pattern.compile("[0-9]{1,6}");
  private static final int SHOWN = 20;

  Entry {
    fields = Collections.unmodifiableMap(new LinkedHashMap<>(fields));
  }

  /**
   * The entries of a file. Its first line that says anything is the title and a 1, the version;
   * lines that start with {@code #} and empty lines say nothing.
   *
   * @throws InstanceException if a line is no entry; names the line and says what to do
   */
  static List<Entry> all(InstanceSource source, String title, List<String> lines) {
    List<Entry> entries = new ArrayList<>();
    boolean isTitled = false;
    for (int i = 0; i < lines.size(); i++) {
      List<String> words = words(lines.get(i));
      if (words.isEmpty()) {
        continue;
      }
      if (isTitled) {
        entries.add(of(source, i + 1, words));
      } else if (words.equals(List.of(title, "1"))) {
        isTitled = true;
      } else {
        String found = shown(String.join(" ", words));
        throw InstanceException.at(
            source, i + 1, "'" + found + "' where the file must begin with '" + title + " 1'");
      }
    }
    if (!isTitled) {
      throw InstanceException.at(
          source, Math.max(1, lines.size()), "nothing here; begin with '" + title + " 1'");
    }
    return entries;
  }

  private static List<String> words(String line) {
    String text = line.strip();
    return text.isEmpty() || text.startsWith("#") ? List.of() : List.of(BLANKS.split(text, -1));
  }

  private static Entry of(InstanceSource source, int line, List<String> words) {
    if (words.size() % 2 != 0) {
      throw InstanceException.at(
          source,
          line,
          "'"
              + shown(words.get(words.size() - 1))
              + "' stands alone at the end; a line is a keyword, a name, then words and values in"
              + " pairs");
    }
    Map<String, String> fields = new LinkedHashMap<>();
    for (int i = 2; i < words.size(); i += 2) {
      if (fields.put(words.get(i), words.get(i + 1)) != null) {
        throw InstanceException.at(
            source, line, "'" + shown(words.get(i)) + "' comes twice; remove one of them");
      }
    }
    return new Entry(source, line, words.get(0), words.get(1), fields);
  }

  /**
   * Checks that the entry has all of {@code needed} and nothing but these and {@code optional}.
   *
   * @return this
   */
  Entry requireFields(List<String> needed, String... optional) {
    List<String> known = new ArrayList<>(needed);
    known.addAll(List.of(optional));
    String fieldsOfIt = known.isEmpty() ? "nothing but its name" : String.join(", ", known);
    String all = "; a " + keyword + " has " + fieldsOfIt;
    for (String field : fields.keySet()) {
      if (!known.contains(field)) {
        throw problem("no field '" + shown(field) + "'" + all);
      }
    }
    for (String field : needed) {
      if (!fields.containsKey(field)) {
        throw problem("the field '" + field + "' is missing" + all);
      }
    }
    return this;
  }

  /** The entry's name, checked to be one. */
  String checkedName() {
    if (!NAME.matcher(name).matches()) {
      throw problem("a name is a letter, then up to 11 letters, digits or hyphens");
    }
    return name;
  }

  /** The entry's name, which is the number {@code expected}. */
  void requireNumber(int expected) {
    if (!name.equals(Integer.toString(expected))) {
      throw problem("number " + expected + " must come here; they count from 1");
    }
  }

  /** The number that stands where names do. */
  int numberAsName(int least, int most) {
    return number("its number", name, least, most);
  }

  String word(String field) {
    return fields.get(field);
  }

  int number(String field, int least, int most) {
    return number(field, fields.get(field), least, most);
  }

  /** The number in an optional field. */
  OptionalInt optionalNumber(String field, int least, int most) {
    return fields.containsKey(field)
        ? OptionalInt.of(number(field, least, most))
        : OptionalInt.empty();
  }

  /** Exactly {@code size} numbers between commas. */
  Ints numbers(String field, int size, int least, int most) {
    List<String> words = List.of(COMMA.split(fields.get(field), -1));
    if (words.size() != size) {
      throw problem(
          field + " must be " + size + " numbers between commas, and are " + words.size());
    }
    return Ints.of(words.stream().mapToInt(word -> number(field, word, least, most)).toArray());
  }

  /** Words between commas. */
  List<String> list(String field) {
    return List.of(COMMA.split(fields.get(field), -1));
  }

  /** The number that {@code word} of a field is. */
  int number(String field, String word, int least, int most) {
    if (!NUMBER.matcher(word).matches()
        || Integer.parseInt(word) < least
        || Integer.parseInt(word) > most) {
      throw problem(
          field + " '" + shown(word) + "' must be a whole number from " + least + " to " + most);
    }
    return Integer.parseInt(word);
  }

  /** The position of {@code word} among {@code names}. */
  int index(String what, String word, List<String> names) {
    int index = names.indexOf(word);
    if (index < 0) {
      String some = names.stream().limit(5).collect(Collectors.joining(", "));
      throw problem(
          "no "
              + what
              + " '"
              + shown(word)
              + "'; "
              + (names.isEmpty() ? "there is none" : "there is " + some)
              + (names.size() > 5 ? ", ..." : ""));
    }
    return index;
  }

  /** What is wrong with this entry. */
  InstanceException problem(String what) {
    return InstanceException.at(source, line, keyword + " " + shown(name) + ": " + what);
  }

  /** The only entry of {@code entries} with that keyword, if there is one. */
  static Optional<Entry> only(String keyword, List<Entry> entries) {
    List<Entry> found = entries.stream().filter(e -> e.keyword().equals(keyword)).toList();
    if (found.size() > 1) {
      throw found.get(1).problem("there is one already, in line " + found.get(0).line());
    }
    return found.stream().findFirst();
  }

  private static String shown(String word) {
    return word.length() <= SHOWN ? word : word.substring(0, SHOWN) + "...";
  }
}
