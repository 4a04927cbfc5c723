package steelyard.adapters.engine.propagators;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class LinearTest {
  static Stream<Subject> subjects() {
    List<Subject> subjects = new ArrayList<>();
    for (int seed = 0; seed < 40; seed++) {
      Random random = new Random(seed);
      int n = 1 + random.nextInt(4);
      Rows rows = Rows.random(random, n, -4, 6, 6);
      boolean unit = random.nextBoolean();
      long[] a = LongStream.generate(() -> coefficient(random, unit)).limit(n).toArray();
      long bound = random.nextInt(15) - 5L;
      subjects.add(atMost(seed, rows, a, bound));
      subjects.add(equal(seed, rows, a, bound));
      subjects.add(unequal(seed, rows, a, bound));
    }
    return subjects.stream();
  }

  private static long coefficient(Random random, boolean unit) {
    return unit ? 1L - 2L * random.nextInt(2) : random.nextInt(7) - 3L;
  }

  private static Subject atMost(int seed, Rows rows, long[] a, long bound) {
    return new Subject(
        "atMost " + Arrays.toString(a) + " seed " + seed,
        rows,
        values -> sum(a, values) <= bound,
        (r, s, x, when) -> r.atMost(0, when, Sum.of(s, a, x), bound),
        Optional.of((s, x) -> new LinearAtMost(Sum.of(s, a, x), bound)),
        Subject.Level.BOUNDS);
  }

  private static Subject equal(int seed, Rows rows, long[] a, long value) {
    return new Subject(
        "equal " + Arrays.toString(a) + " seed " + seed,
        rows,
        values -> sum(a, values) == value,
        (r, s, x, when) -> r.equal(0, when, Sum.of(s, a, x), value),
        Optional.of((s, x) -> new LinearEqual(Sum.of(s, a, x), value)),
        LongStream.of(a).allMatch(c -> Math.abs(c) <= 1)
            ? Subject.Level.BOUNDS
            : Subject.Level.SOUND);
  }

  private static Subject unequal(int seed, Rows rows, long[] a, long value) {
    return new Subject(
        "unequal " + Arrays.toString(a) + " seed " + seed,
        rows,
        values -> sum(a, values) != value,
        (r, s, x, when) -> r.unequal(0, when, Sum.of(s, a, x), value),
        Optional.empty(),
        Subject.Level.DOMAIN);
  }

  private static long sum(long[] a, int[] values) {
    long sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * values[i];
    }
    return sum;
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 4; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }
}
