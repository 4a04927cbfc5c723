package steelyard.adapters.engine.propagators;

import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class MaximumTest {
  static Stream<Subject> subjects() {
    return IntStream.range(0, 30).mapToObj(MaximumTest::subject);
  }

  private static Subject subject(int seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(4);
    return Subject.ofBody(
        "maximum " + seed,
        Rows.random(random, n + 1, -3, 5, 5),
        values -> values[n] == IntStream.of(values).limit(n).max().getAsInt(),
        Subject.Level.BOUNDS,
        (s, x) -> new Maximum(x.rows(0, n), x.rows(n, n + 1)));
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 6; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }
}
