package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;

class AllDifferentTest {
  static Stream<Subject> subjects() {
    List<Subject> subjects = new ArrayList<>();
    for (int seed = 0; seed < 30; seed++) {
      Random random = new Random(seed);
      int n = 1 + random.nextInt(5);
      Rows rows = Rows.random(random, n, 0, n + random.nextInt(3), n + 1);
      subjects.add(
          new Subject(
              "bounds " + seed,
              rows,
              AllDifferentTest::different,
              (r, s, x, when) -> r.allDifferent(0, when, x, Level.BOUNDS),
              Optional.of((s, x) -> new AllDifferentBounds(x)),
              Subject.Level.BOUNDS));
      subjects.add(
          new Subject(
              "domain " + seed,
              rows,
              AllDifferentTest::different,
              (r, s, x, when) -> r.allDifferent(0, when, x, Level.DOMAIN),
              Optional.of(AllDifferentDomain::new),
              Subject.Level.DOMAIN));
    }
    return subjects.stream();
  }

  private static boolean different(int[] values) {
    return IntStream.of(values).distinct().count() == values.length;
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 4; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }

  private static Bench propagated(Level level, Rows rows) {
    Bench bench = new Bench(rows, new Random(1), false, false);
    bench.relations.allDifferent(0, Atom.TRUE, bench.scope, level);
    assertThat(bench.network.propagate()).isTrue();
    return bench;
  }

  private static void expect(Bench bench, int[]... domains) {
    for (int i = 0; i < domains.length; i++) {
      assertThat(bench.domains().row(i)).as("row %d", i).containsExactly(domains[i]);
    }
  }

  /**
   * The speeches of Puget (1998), A fast algorithm for the bound consistency of alldiff
   * constraints, AAAI; as in table 1 of van Hoeve (2001), The alldifferent constraint: a survey,
   * arXiv:cs/0105015. Both levels leave the same.
   */
  @Test
  void schedulesTheSpeeches() {
    Rows speeches =
        Rows.of(
            Rows.range(3, 6),
            Rows.range(3, 4),
            Rows.range(2, 5),
            Rows.range(2, 4),
            Rows.range(3, 4),
            Rows.range(1, 6));
    for (Level level : Level.values()) {
      expect(
          propagated(level, speeches),
          new int[] {6},
          new int[] {3, 4},
          new int[] {5},
          new int[] {2},
          new int[] {3, 4},
          new int[] {1});
    }
    assertThat(speeches.solutions(AllDifferentTest::different)).hasSize(2);
  }

  /** Six rows in the manner of Régin (1994), AAAI 362-367; from memory, counted here. */
  @Test
  void fixesWhatAHallSetLeavesOver() {
    Rows rows =
        Rows.of(
            new int[] {1, 2},
            new int[] {2, 3},
            new int[] {1, 3},
            new int[] {2, 4},
            new int[] {3, 4, 5, 6},
            new int[] {6, 7});
    for (Level level : Level.values()) {
      expect(
          propagated(level, rows),
          new int[] {1, 2},
          new int[] {2, 3},
          new int[] {1, 3},
          new int[] {4},
          new int[] {5, 6},
          new int[] {6, 7});
    }
    assertThat(rows.solutions(AllDifferentTest::different)).hasSize(6);
  }

  /** Letters a to e as 1 to 5; van Hoeve (2001), as above, from memory. */
  @Test
  void removesAHallSetFromWithinADomain() {
    Rows rows =
        Rows.of(new int[] {2, 3, 4, 5}, new int[] {2, 3}, new int[] {1, 2, 3, 4}, new int[] {2, 3});
    expect(
        propagated(Level.DOMAIN, rows),
        new int[] {4, 5},
        new int[] {2, 3},
        new int[] {1, 4},
        new int[] {2, 3});
    assertThat(rows.solutions(AllDifferentTest::different)).hasSize(6);
  }

  @Test
  void separatesTheLevels_whereTheHallSetHasAHole() {
    Rows three = Rows.of(new int[] {1, 3}, new int[] {1, 3}, Rows.range(1, 4));
    expect(propagated(Level.DOMAIN, three), new int[] {1, 3}, new int[] {1, 3}, new int[] {2, 4});
    expect(
        propagated(Level.BOUNDS, three),
        new int[] {1, 3},
        new int[] {1, 3},
        new int[] {1, 2, 3, 4});
    Rows four = Rows.of(new int[] {1, 3}, new int[] {1, 3}, Rows.range(1, 3), Rows.range(2, 4));
    expect(
        propagated(Level.DOMAIN, four),
        new int[] {1, 3},
        new int[] {1, 3},
        new int[] {2},
        new int[] {4});
    expect(
        propagated(Level.BOUNDS, four),
        new int[] {1, 3},
        new int[] {1, 3},
        new int[] {1, 2, 3},
        new int[] {4});
  }

  @Test
  void failsOnThreeRowsForTwoValues() {
    for (Level level : Level.values()) {
      Bench bench =
          new Bench(
              Rows.of(Rows.range(1, 2), Rows.range(1, 2), Rows.range(1, 2)),
              new Random(0),
              false,
              false);
      bench.relations.allDifferent(0, Atom.TRUE, bench.scope, level);
      assertThat(bench.network.propagate()).isFalse();
    }
  }

  @Test
  void followsAChainOfFixedRows() {
    Rows chain = Rows.of(Rows.range(1, 1), Rows.range(1, 2), Rows.range(2, 3), Rows.range(3, 4));
    expect(
        propagated(Level.BOUNDS, chain),
        new int[] {1},
        new int[] {2},
        new int[] {3},
        new int[] {4});
  }
}
