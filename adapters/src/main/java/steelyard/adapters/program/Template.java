package steelyard.adapters.program;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A command with placeholders, as a setting gives it: words with blanks between them, the first of
 * them the program; a word that has blanks stands in double quotes. No shell is involved.
 *
 * @param words the program, and its arguments
 */
record Template(List<String> words) {
  static final String CNF = "cnf";
  static final String SEED = "seed";
  static final String SECONDS = "seconds";
  static final String THREADS = "threads";
  static final String PROGRAM = "program";

  /** Programs take seeds of 31 bits, some of fewer. */
  private static final long SEEDS = 1_000_000_000;

  private static final Pattern WORD = Pattern.compile("\"([^\"]*)\"|\\S+");
  private static final Pattern PLACEHOLDER = Pattern.compile("\\{([^{}]*)}");

  Template {
    words = List.copyOf(words);
  }

  static Template of(String text) {
    return new Template(
        WORD.matcher(text)
            .results()
            .map(word -> word.group(1) == null ? word.group() : word.group(1))
            .toList());
  }

  /** The program's path or name. */
  String program() {
    return words.get(0);
  }

  boolean has(String placeholder) {
    return words.stream().anyMatch(word -> word.contains("{" + placeholder + "}"));
  }

  /** A placeholder that is none of {@code known}. */
  Optional<String> unknown(List<String> known) {
    return words.stream()
        .flatMap(word -> PLACEHOLDER.matcher(word).results())
        .map(found -> found.group(1))
        .filter(name -> !known.contains(name))
        .findFirst();
  }

  /** The command that solves. */
  List<String> solving(Path cnf, long seed, long secondsLeft, int threads) {
    return with(
        Map.of(
            CNF, cnf.toString(),
            SEED, Long.toString(Math.floorMod(seed, SEEDS)),
            SECONDS, Long.toString(Math.max(1, secondsLeft)),
            THREADS, Integer.toString(threads)));
  }

  List<String> with(Map<String, String> values) {
    return words.stream()
        .map(
            word ->
                PLACEHOLDER
                    .matcher(word)
                    .replaceAll(found -> Matcher.quoteReplacement(values.get(found.group(1)))))
        .toList();
  }
}
