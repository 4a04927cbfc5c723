package steelyard.adapters.cpsat;

import java.util.Optional;
import java.util.OptionalLong;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Reads the library's log, which is for people and changes between versions: what is not recognised
 * is passed over.
 */
final class ProgressLine {
  private static final Pattern PHASE = Pattern.compile("Starting (presolve|search)\\b.*");

  /** Numbers are rounded to nine digits: a longer one has an exponent and does not match. */
  private static final Pattern BOUND =
      Pattern.compile("#(?:Bound|[0-9]+)\\s.*\\bnext:\\[(-?[0-9]{1,9}),.*");

  private static final Pattern STARTED = Pattern.compile("#(?:Bound|[0-9]+|Done)\\s.*");

  private ProgressLine() {}

  /** The phase that begins. */
  static Optional<String> phase(String line) {
    Matcher matcher = PHASE.matcher(line);
    return matcher.matches() ? Optional.of(matcher.group(1)) : Optional.empty();
  }

  /**
   * What the inner objective is proved to be at least; empty where the log does not say it exactly.
   */
  static OptionalLong bound(String line) {
    Matcher matcher = BOUND.matcher(line);
    return matcher.matches()
        ? OptionalLong.of(Long.parseLong(matcher.group(1)))
        : OptionalLong.empty();
  }

  /** Whether the line shows that bounds are kept, which begins after presolve. */
  static boolean keepsBounds(String line) {
    return STARTED.matcher(line).matches();
  }
}
