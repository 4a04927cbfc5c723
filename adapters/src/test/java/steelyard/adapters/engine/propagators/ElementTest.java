package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

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

class ElementTest {
  static Stream<Subject> subjects() {
    return IntStream.range(0, 30)
        .boxed()
        .flatMap(seed -> Stream.of(ofVariables(seed), ofConstants(seed)));
  }

  private static Subject ofVariables(int seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(3);
    Rows array = Rows.random(random, n, 0, 6, 4);
    Rows indexAndResult = Rows.random(random, 1, -1, n, n + 1).and(Rows.random(random, 1, 0, 6, 5));
    return Subject.ofBody(
        "of variables " + seed,
        array.and(indexAndResult),
        v -> v[n] >= 0 && v[n] < n && v[v[n]] == v[n + 1],
        Subject.Level.DOMAIN,
        (s, x) -> new Element(s, x.rows(0, n), x.rows(n, n + 1), x.rows(n + 1, n + 2)));
  }

  private static Subject ofConstants(int seed) {
    Random random = new Random(seed);
    int n = 1 + random.nextInt(8);
    int[] entries = random.ints(n, -3, 6).toArray();
    Rows indexAndResult =
        Rows.random(random, 1, -2, n + 1, n + 3).and(Rows.random(random, 1, -3, 6, 8));
    return Subject.ofBody(
        "of constants " + seed,
        indexAndResult,
        v -> v[0] >= 0 && v[0] < n && entries[v[0]] == v[1],
        Subject.Level.DOMAIN,
        (s, x) -> new Element(s, constants(s, entries), x.rows(0, 1), x.rows(1, 2)));
  }

  private static Scope constants(Store s, int[] entries) {
    return Scope.of(s, new int[entries.length], entries);
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 4; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }

  @Test
  void boundsAWideResult() {
    Store s = new Store();
    int index = s.variable(0, 2);
    int result = s.variable(-1_000_000_000, 1_000_000_000);
    Network network = new Network(s);
    Scope array = constants(s, new int[] {700_000_000, -5, 12});
    new Relations(network)
        .post(0, Atom.TRUE, new Element(s, array, Scope.of(index), Scope.of(result)));
    assertThat(network.propagate()).isTrue();
    assertThat(s.min(result)).isEqualTo(-5);
    assertThat(s.max(result)).isEqualTo(700_000_000);
    s.push();
    assertThat(network.propagate(Atom.ge(result, 13))).isTrue();
    assertThat(s.min(index)).isZero();
    assertThat(s.fixed(index)).isTrue();
    assertThat(s.min(result)).isEqualTo(700_000_000);
  }
}
