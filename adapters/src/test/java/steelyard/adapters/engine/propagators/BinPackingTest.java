package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;

class BinPackingTest {
  static Stream<Subject> subjects() {
    return IntStream.range(0, 40).mapToObj(BinPackingTest::subject);
  }

  private static Subject subject(int seed) {
    Random random = new Random(seed);
    int items = 1 + random.nextInt(4);
    int bins = 1 + random.nextInt(3);
    long[] sizes = random.longs(items, 0, 5).toArray();
    Rows rows =
        Rows.random(random, items, -1, bins, bins + 1).and(Rows.random(random, bins, 0, 9, 6));
    return Subject.ofBody(
        "bin packing " + seed,
        rows,
        values -> packs(values, sizes, bins),
        Subject.Level.SOUND,
        (s, x) -> new BinPacking(x.rows(0, items), sizes, x.rows(items, items + bins)));
  }

  private static boolean packs(int[] values, long[] sizes, int bins) {
    long[] loads = new long[bins];
    for (int i = 0; i < sizes.length; i++) {
      if (values[i] < 0 || values[i] >= bins) {
        return false;
      }
      loads[values[i]] += sizes[i];
    }
    return IntStream.range(0, bins).allMatch(b -> loads[b] == values[sizes.length + b]);
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 4; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }

  @Test
  void placesWhatOnlyFitsInOneBin() {
    Rows rows =
        Rows.of(
            Rows.range(0, 1),
            Rows.range(0, 1),
            Rows.range(0, 1),
            Rows.range(0, 4),
            Rows.range(0, 10));
    Bench bench = new Bench(rows, new Random(3), false, false);
    bench.relations.post(
        0,
        Atom.TRUE,
        new BinPacking(bench.scope.rows(0, 3), new long[] {5, 6, 2}, bench.scope.rows(3, 5)));
    assertThat(bench.network.propagate()).isFalse();
    Bench roomier =
        new Bench(
            Rows.of(
                Rows.range(0, 1),
                Rows.range(0, 1),
                Rows.range(0, 1),
                Rows.range(0, 4),
                Rows.range(0, 11)),
            new Random(3),
            false,
            false);
    roomier.relations.post(
        0,
        Atom.TRUE,
        new BinPacking(roomier.scope.rows(0, 3), new long[] {5, 6, 2}, roomier.scope.rows(3, 5)));
    assertThat(roomier.network.propagate()).isTrue();
    assertThat(roomier.domains().row(0)).containsExactly(1);
    assertThat(roomier.domains().row(1)).containsExactly(1);
    assertThat(roomier.domains().row(2)).containsExactly(0);
    assertThat(roomier.domains().row(3)).containsExactly(2);
  }
}
