package steelyard.adapters.program;

import java.io.BufferedInputStream;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import steelyard.adapters.spi.Programs.Ended;

/**
 * What a solver printed, read by the output format of the SAT competitions: lines of which the
 * first character says what they are: {@code s} the status, once; {@code v} literals of a model,
 * ended by a 0; {@code c} comments. Other lines are passed over: a message may begin with any
 * letter. Nothing is taken for an answer unless status line, exit code and literals fit together.
 *
 * @see <a href="https://satcompetition.github.io/2024/output.html">the format</a>
 */
final class AnswerText {
  private static final int SATISFIABLE_CODE = 10;
  private static final int UNSATISFIABLE_CODE = 20;

  /** What a shell and the loader of programs return where a program or a library is missing. */
  private static final int NOT_LOADED_CODE = 127;

  private static final int SIGNAL_BASE = 128;

  /** A status or a comment of interest is shorter. */
  private static final int LONGEST_LINE = 200;

  /** Both orders in which solvers print their statistics. */
  private static final Pattern COUNTER =
      Pattern.compile(
          "\\s*(?:(?<name>conflicts|decisions|propagations|restarts)\\s*:\\s*(?<count>[0-9]{1,18})"
              + "|(?<first>[0-9]{1,18})\\s+(?<second>conflicts|decisions|propagations|restarts))"
              + "(?:\\s.*)?");

  private final int variables;
  private final Assignment assignment;
  private final SortedMap<String, Long> counters = new TreeMap<>();
  private int statuses;
  private String status = "";
  private boolean hasValues;
  private boolean isEnded;
  private String mistake = "";

  private AnswerText(int variables) {
    this.variables = variables;
    this.assignment = new Assignment(variables);
  }

  /** Reads the output of a solver that was given a formula over so many variables. */
  static AnswerText read(Path output, int variables) throws IOException {
    AnswerText text = new AnswerText(variables);
    try (InputStream in = new BufferedInputStream(Files.newInputStream(output), 1 << 16)) {
      text.read(in);
    }
    return text;
  }

  /** The counters that it printed, under the names that backends share. */
  SortedMap<String, Long> counters() {
    return counters;
  }

  /** What it says, given how it ended; a model is still to be checked. */
  Answer answer(Ended ended) {
    return switch (ended.how()) {
      case STOPPED -> new Answer.Stopped();
      case WROTE_TOO_MUCH -> new Answer.Nothing("it was ended because it wrote too much");
      case ITSELF -> {
        String wrong = wrong(ended);
        yield wrong.isEmpty() ? answer() : new Answer.Nothing(wrong);
      }
    };
  }

  private Answer answer() {
    return status.equals("SATISFIABLE") ? new Answer.Model(assignment) : new Answer.NoModel();
  }

  /** Why there is no answer; empty if there is one. */
  private String wrong(Ended ended) {
    if (statuses == 0) {
      return "it printed no status line; " + end(ended);
    }
    if (statuses > 1) {
      return "it printed " + statuses + " status lines";
    }
    return switch (status) {
      case "SATISFIABLE" -> wrongModel(ended);
      case "UNSATISFIABLE" ->
          ended.code() != UNSATISFIABLE_CODE
              ? mismatch(ended)
              : hasValues ? "it printed 's UNSATISFIABLE' and a model" : "";
      case "UNKNOWN" -> "it gave up: 's UNKNOWN'; " + end(ended);
      default -> "its status line says '" + status + "'";
    };
  }

  private String wrongModel(Ended ended) {
    if (ended.code() != SATISFIABLE_CODE) {
      return mismatch(ended);
    }
    if (!mistake.isEmpty()) {
      return mistake;
    }
    if (!hasValues) {
      return "it printed 's SATISFIABLE' and no model";
    }
    return isEnded ? "" : "its model breaks off: no 0 at the end";
  }

  private String mismatch(Ended ended) {
    return "it printed 's " + status + "' but ended otherwise: " + end(ended);
  }

  private static String end(Ended ended) {
    int code = ended.code();
    String how =
        code > SIGNAL_BASE
            ? "killed by signal " + (code - SIGNAL_BASE)
            : code == NOT_LOADED_CODE
                ? "exit code 127: it, or a library of it, was not found"
                : "exit code " + code;
    String said = ended.lastWords().lines().reduce("", (before, line) -> line).strip();
    return said.isEmpty() ? how : how + ": " + said;
  }

  private void read(InputStream in) throws IOException {
    for (int kind = in.read(); kind >= 0; kind = in.read()) {
      if (kind != '\n') {
        int next = in.read();
        boolean isBlank = next == ' ' || next == '\t';
        if (kind == 'v' && (isBlank || next == '\n' || next == '\r' || next < 0)) {
          values(in, next);
        } else if (kind == 's' && isBlank) {
          statuses++;
          status = rest(in, in.read());
        } else {
          String line = rest(in, next);
          if (kind == 'c' && isBlank) {
            comment(line);
          }
        }
      }
    }
  }

  /** The line from {@code first} on, stripped, its end left out if it is long. */
  private static String rest(InputStream in, int first) throws IOException {
    StringBuilder line = new StringBuilder();
    for (int read = first; read >= 0 && read != '\n'; read = in.read()) {
      if (line.length() < LONGEST_LINE) {
        line.append(read >= ' ' && read < 127 ? (char) read : ' ');
      }
    }
    return line.toString().strip();
  }

  private void comment(String line) {
    Matcher found = COUNTER.matcher(line);
    if (found.matches()) {
      boolean isNamedFirst = found.group("name") != null;
      String name = found.group(isNamedFirst ? "name" : "second");
      long count = Long.parseLong(found.group(isNamedFirst ? "count" : "first"));
      counters.put(name.equals("conflicts") ? "failures" : name, count);
    }
  }

  /** The literals of one line. */
  private void values(InputStream in, int first) throws IOException {
    hasValues = true;
    int read = first;
    while (read >= 0 && read != '\n') {
      if (read == ' ' || read == '\t' || read == '\r') {
        read = in.read();
      } else {
        read = literal(in, read);
      }
    }
  }

  /** One literal; what was read after it. */
  private int literal(InputStream in, int first) throws IOException {
    boolean isNegative = first == '-';
    int read = isNegative ? in.read() : first;
    long variable = 0;
    int digits = 0;
    while (read >= '0' && read <= '9') {
      variable = Math.min(10 * variable + read - '0', Integer.MAX_VALUE);
      digits++;
      read = in.read();
    }
    if (digits == 0 || !(read < 0 || Character.isWhitespace(read))) {
      note("its model has something that is no literal");
      return endOfLine(in, read);
    }
    take((int) (isNegative ? -variable : variable));
    return read;
  }

  private static int endOfLine(InputStream in, int first) throws IOException {
    int read = first;
    while (read >= 0 && read != '\n') {
      read = in.read();
    }
    return read;
  }

  private void take(int literal) {
    if (isEnded) {
      note("its model goes on after the 0");
    } else if (literal == 0) {
      isEnded = true;
    } else if (Math.abs(literal) > variables) {
      note("its model names variable " + Math.abs(literal) + " of " + variables);
    } else if (!assignment.put(literal)) {
      note("its model says both of variable " + Math.abs(literal));
    }
  }

  private void note(String what) {
    mistake = mistake.isEmpty() ? what : mistake;
  }
}
