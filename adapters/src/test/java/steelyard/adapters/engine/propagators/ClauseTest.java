package steelyard.adapters.engine.propagators;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Scope;

class ClauseTest {
  /** {@code [row op value]}; op 0 is ≥, 1 is ≤, 2 is =, 3 is ≠. */
  private record Literal(int row, int op, int value) {
    boolean holds(int[] values) {
      int v = values[row];
      return switch (op) {
        case 0 -> v >= value;
        case 1 -> v <= value;
        case 2 -> v == value;
        default -> v != value;
      };
    }

    long atom(Scope x) {
      return switch (op) {
        case 0 -> x.ge(row, value);
        case 1 -> x.le(row, value);
        case 2 -> x.eq(row, value);
        default -> x.ne(row, value);
      };
    }
  }

  static Stream<Subject> subjects() {
    return IntStream.range(0, 30).mapToObj(ClauseTest::subject);
  }

  private static Subject subject(int seed) {
    Random random = new Random(seed);
    Rows rows = Rows.random(random, 2 + random.nextInt(3), -3, 4, 5);
    int count = 1 + random.nextInt(4);
    List<List<Literal>> clauses = new ArrayList<>();
    for (int c = 0; c < count; c++) {
      clauses.add(
          IntStream.rangeClosed(0, random.nextInt(4))
              .mapToObj(
                  i ->
                      new Literal(
                          random.nextInt(rows.size()), random.nextInt(4), random.nextInt(8) - 3))
              .toList());
    }
    return new Subject(
        "clauses " + seed,
        rows,
        values ->
            clauses.stream().allMatch(clause -> clause.stream().anyMatch(l -> l.holds(values))),
        (r, s, x, when) ->
            clauses.forEach(
                clause -> r.clause(0, when, clause.stream().mapToLong(l -> l.atom(x)).toArray())),
        Optional.empty(),
        Subject.Level.SOUND);
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 6; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }
}
