package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

class TableTest {
  static Stream<Subject> subjects() {
    return IntStream.range(0, 25)
        .boxed()
        .flatMap(seed -> Stream.of(allowed(seed), forbidden(seed), large(seed)));
  }

  /** Several hundred distinct tuples that are all within the domains: several words of bits. */
  private static Subject large(int seed) {
    Random random = new Random(seed);
    int[] tuples =
        random
            .ints(0, 6 * 6 * 6 * 6)
            .distinct()
            .limit(150 + 10L * seed)
            .flatMap(code -> IntStream.of(code % 6, code / 6 % 6, code / 36 % 6, code / 216))
            .toArray();
    Rows rows = Rows.random(random, 4, 0, 5, 6).filled();
    return Subject.ofBody(
        "large " + seed,
        rows,
        values -> matches(tuples, values),
        Subject.Level.SOUND,
        (s, x) -> new Table(s, x, tuples));
  }

  private static Subject allowed(int seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(4);
    int[] tuples = tuples(random, n, 1 + random.nextInt(12), seed % 3 == 0);
    return new Subject(
        "allowed " + seed,
        Rows.random(random, n, 0, 5, 6),
        values -> matches(tuples, values),
        (r, s, x, when) -> r.allowed(0, when, x, tuples),
        seed % 3 == 0 ? Optional.empty() : Optional.of((s, x) -> new Table(s, x, tuples)),
        Subject.Level.SOUND);
  }

  private static Subject forbidden(int seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(3);
    int[] tuples = tuples(random, n, 1 + random.nextInt(8), seed % 2 == 0);
    return new Subject(
        "forbidden " + seed,
        Rows.random(random, n, 0, 5, 5),
        values -> !matches(tuples, values),
        (r, s, x, when) -> r.forbidden(0, when, x, tuples),
        Optional.empty(),
        Subject.Level.SOUND);
  }

  private static int[] tuples(Random random, int n, int count, boolean stars) {
    return IntStream.range(0, n * count)
        .map(t -> stars && random.nextInt(5) == 0 ? Table.ANY : random.nextInt(7))
        .toArray();
  }

  private static boolean matches(int[] tuples, int[] values) {
    for (int t = 0; t < tuples.length; t += values.length) {
      boolean all = true;
      for (int i = 0; i < values.length; i++) {
        all &= tuples[t + i] == Table.ANY || tuples[t + i] == values[i];
      }
      if (all) {
        return true;
      }
    }
    return false;
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 5; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }

  /** On variables that are narrow at the root, what is promised is more than above. */
  @ParameterizedTest
  @MethodSource("subjects")
  void removesEveryValueWithoutATuple(Subject subject) {
    if (subject.name().startsWith("forbidden")) {
      return;
    }
    Subject strong =
        new Subject(
            subject.name(),
            subject.rows(),
            subject.holds(),
            subject.poster(),
            subject.body(),
            Subject.Level.DOMAIN);
    for (long seed : new long[] {1, 2, 4}) {
      SubjectChecks.reachesItsLevelAtTheRoot(strong, seed);
    }
  }

  @Test
  void cutsAWideColumnToTheTuples() {
    Store s = new Store();
    int x = s.variable(-1_000_000_000, 1_000_000_000);
    int y = s.variable(0, 3);
    Network network = new Network(s);
    int[] tuples = {-900_000_000, 1, 5, 2, 900_000_000, 2, 0, 3};
    new Relations(network).allowed(0, Atom.TRUE, Scope.of(x, y), tuples);
    assertThat(network.propagate()).isTrue();
    assertThat(s.min(x)).isEqualTo(-900_000_000);
    s.push();
    assertThat(network.propagate(Atom.eq(y, 2))).isTrue();
    assertThat(s.min(x)).isEqualTo(5);
    assertThat(network.propagate(Atom.ge(x, 6))).isTrue();
    assertThat(s.min(x)).isEqualTo(900_000_000);
    s.popTo(0);
    assertThat(network.propagate(Atom.eq(x, 17))).isFalse();
  }

  @Test
  void saysWhetherShortTuplesFit() {
    Store s = new Store();
    Scope wide = Scope.of(s.variable(0, 5000), s.variable(0, 5));
    int[] tuples = {7, 1, 9, Table.ANY};
    assertThat(Table.fits(s, wide, tuples)).isTrue();
    assertThat(Table.fits(s, wide, new int[] {Table.ANY, 1})).isFalse();
  }
}
