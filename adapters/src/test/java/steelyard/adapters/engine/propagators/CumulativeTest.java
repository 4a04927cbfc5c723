package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Random;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

class CumulativeTest {
  static Stream<Subject> subjects() {
    return IntStream.range(0, 60).mapToObj(seed -> subject(seed, seed % 2 == 0));
  }

  private static Subject subject(int seed, boolean flexible) {
    Random random = new Random(seed);
    int n = flexible ? 2 + random.nextInt(2) : 2 + random.nextInt(3);
    RandomTasks rows = new RandomTasks(random, n, 2 + random.nextInt(5), 3, flexible);
    int[] fixedDemand = random.ints(n, 0, 4).toArray();
    int demandRow = flexible ? rows.add(Rows.range(0, 1 + random.nextInt(2))) : -1;
    int capacityRow = rows.add(Rows.random(random, 1, 0, 5, 3).row(0));
    return Subject.ofBody(
            "cumulative " + seed,
            rows.rows(),
            values -> fits(rows, values, n, fixedDemand, demandRow, capacityRow),
            Subject.Level.SOUND,
            (s, x) -> {
              Scope demands = Scope.of(s, new int[n], fixedDemand);
              if (demandRow >= 0) {
                demands = RandomTasks.row(x, demandRow).and(demands.rows(1, n));
              }
              return new Cumulative(s, rows.tasks(s, x), demands, RandomTasks.row(x, capacityRow));
            })
        .given(rows.linked(), (r, s, x, when) -> rows.postLinks(r, s, x));
  }

  private static boolean fits(
      RandomTasks rows, int[] values, int n, int[] fixedDemand, int demandRow, int capacityRow) {
    for (int t = 0; t < 20; t++) {
      int used = 0;
      boolean some = false;
      for (int i = 0; i < n; i++) {
        if (rows.present(values, i) && rows.start(values, i) <= t && t < rows.end(values, i)) {
          used += i == 0 && demandRow >= 0 ? values[demandRow] : fixedDemand[i];
          some = true;
        }
      }
      if (some && used > values[capacityRow]) {
        return false;
      }
    }
    return true;
  }

  @ParameterizedTest
  @MethodSource("subjects")
  void passesAllChecks(Subject subject) {
    for (long seed = 1; seed <= 3; seed++) {
      SubjectChecks.all(subject, seed);
    }
  }

  @Test
  void pushesATaskPastTheProfile() {
    Store s = new Store();
    Scope start = Scope.of(s.variable(2, 3), s.variable(0, 9));
    Network network = new Network(s);
    Scope demands = Scope.of(s, new int[2], new int[] {2, 2});
    Scope capacity = Scope.of(s, new int[1], new int[] {3});
    network.post(new Cumulative(s, TaskScope.fixed(s, start, 4, 3), demands, capacity), 0);
    assertThat(network.propagate()).isTrue();
    assertThat(start.min(s, 1)).isZero();
    s.push();
    assertThat(network.propagate(start.ge(1, 1))).isTrue();
    assertThat(start.min(s, 1)).isEqualTo(6);
  }

  @Test
  void findsAnOverloadThatNoProfileShows() {
    Store s = new Store();
    Scope start = Scope.of(s.variable(0, 2), s.variable(0, 2), s.variable(0, 2));
    Network network = new Network(s);
    Scope demands = Scope.of(s, new int[3], new int[] {2, 2, 3});
    Scope capacity = Scope.of(s, new int[1], new int[] {3});
    network.post(new Cumulative(s, TaskScope.fixed(s, start, 2, 2, 2), demands, capacity), 0);
    assertThat(network.propagate()).isFalse();
  }
}
