package steelyard.results.ledger;

import java.util.List;

/**
 * The small integers that stand for words in the tables. The order here is the ledger's, whatever
 * order the words are declared in; the table {@code word} repeats it.
 */
final class Codes<E extends Enum<E>> {

  static final Codes<Status> STATUS =
      new Codes<>(
          "status", List.of(Status.OPTIMAL, Status.FEASIBLE, Status.INFEASIBLE, Status.UNKNOWN));

  static final Codes<Ending> ENDING =
      new Codes<>(
          "ending",
          List.of(
              Ending.COMPLETED,
              Ending.TIME_LIMIT,
              Ending.WORK_LIMIT,
              Ending.MEMORY_LIMIT,
              Ending.CRASHED,
              Ending.UNSUPPORTED,
              Ending.STOPPED));

  static final Codes<Check> VERDICT =
      new Codes<>("verdict", List.of(Check.UNCHECKED, Check.VALID, Check.INVALID));

  static final Codes<Goal.Kind> GOAL =
      new Codes<>("goal", List.of(Goal.Kind.SATISFY, Goal.Kind.OPTIMISE, Goal.Kind.ENUMERATE));

  static final Codes<Conditions.Mode> MODE =
      new Codes<>("mode", List.of(Conditions.Mode.COLD, Conditions.Mode.WARM));

  private final String kind;
  private final List<E> words;

  private Codes(String kind, List<E> words) {
    this.kind = kind;
    this.words = words;
  }

  /** What the table {@code word} calls these. */
  String kind() {
    return kind;
  }

  /** The words by their codes from 0. */
  List<E> words() {
    return words;
  }

  int of(E word) {
    int code = words.indexOf(word);
    if (code < 0) {
      throw new IllegalStateException("no code for the %s %s".formatted(kind, word));
    }
    return code;
  }

  E word(int code) {
    return words.get(code);
  }
}
