package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

class NoOverlapTest {
  static Stream<Subject> subjects() {
    List<Subject> subjects = new ArrayList<>();
    for (int seed = 0; seed < 60; seed++) {
      subjects.add(subject(seed, seed % 2 == 0));
    }
    return subjects.stream();
  }

  private static Subject subject(int seed, boolean flexible) {
    Random random = new Random(seed);
    int n = flexible ? 3 : 2 + random.nextInt(4);
    RandomTasks rows = new RandomTasks(random, n, 3 + random.nextInt(7), 4, flexible);
    return Subject.ofBody(
            "no overlap " + seed,
            rows.rows(),
            values -> apart(rows, values, n),
            Subject.Level.SOUND,
            (s, x) -> new NoOverlap(rows.tasks(s, x)))
        .given(rows.linked(), (r, s, x, when) -> rows.postLinks(r, s, x));
  }

  private static boolean apart(RandomTasks rows, int[] values, int n) {
    for (int i = 0; i < n; i++) {
      for (int j = i + 1; j < n; j++) {
        if (rows.present(values, i)
            && rows.present(values, j)
            && rows.end(values, i) > rows.start(values, j)
            && rows.end(values, j) > rows.start(values, i)) {
          return false;
        }
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

  /** Tasks given by earliest start, latest end and duration. */
  private static final class Machine {
    final Store store = new Store();
    final TaskScope tasks;
    final Scope start;

    Machine(int[]... windows) {
      int[] starts = new int[windows.length];
      int[] durations = new int[windows.length];
      for (int i = 0; i < windows.length; i++) {
        durations[i] = windows[i][2];
        starts[i] = store.variable(windows[i][0], windows[i][1] - windows[i][2]);
      }
      start = Scope.of(starts);
      tasks = TaskScope.fixed(store, start, durations);
    }

    int[] earliestStarts() {
      int[] earliest = new int[start.size()];
      for (int i = 0; i < earliest.length; i++) {
        earliest[i] = start.min(store, i);
      }
      return earliest;
    }
  }

  /** Example on page 38 of Vilím (2007), Global constraints in scheduling, thesis, Prague. */
  @Test
  void knowsTheEarliestEndOfASet() {
    ThetaTree tree = new ThetaTree(4);
    int[][] tasks = {{0, 5}, {25, 6}, {30, 4}, {32, 10}};
    long[] ends = {5, 31, 35, 45};
    for (int i = 0; i < tasks.length; i++) {
      tree.add(i, tasks[i][0], tasks[i][1]);
      assertThat(tree.end()).isEqualTo(ends[i]);
    }
    assertThat(tree.work()).isEqualTo(25);
    tree.remove(3);
    assertThat(tree.end()).isEqualTo(35);
  }

  /** Example on page 45 of the same thesis. */
  @Test
  void knowsTheOptionalTaskThatIsResponsible() {
    ThetaTree tree = new ThetaTree(4);
    tree.add(0, 5, 5);
    tree.add(1, 25, 6);
    tree.addOptional(2, 30, 5);
    tree.add(3, 32, 10);
    assertThat(tree.end()).isEqualTo(42);
    assertThat(tree.optionalEnd()).isEqualTo(46);
    assertThat(tree.responsible()).isEqualTo(2);
  }

  /** In the manner of Vilím (2004), CPAIOR; from memory, the 2 feasible orders counted here. */
  @Test
  void findsTheEdge() {
    Machine machine = new Machine(new int[] {4, 30, 4}, new int[] {5, 13, 3}, new int[] {5, 13, 5});
    assertThat(new UnaryRules(machine.tasks).edges(machine.store)).isTrue();
    assertThat(machine.earliestStarts()).containsExactly(13, 5, 5);
  }

  /** Likewise. */
  @Test
  void findsThePrecedence_whereEdgeFindingSeesNothing() {
    Machine machine =
        new Machine(new int[] {0, 25, 11}, new int[] {1, 27, 10}, new int[] {14, 35, 5});
    UnaryRules rules = new UnaryRules(machine.tasks);
    assertThat(rules.edges(machine.store)).isTrue();
    assertThat(machine.earliestStarts()).containsExactly(0, 1, 14);
    assertThat(rules.precedences(machine.store)).isTrue();
    assertThat(machine.earliestStarts()).containsExactly(0, 1, 21);
  }

  /** Earliest starts that are exact, by all orders. */
  @Test
  void findsWithEdgesWhatPrecedencesDoNot() {
    int[][] windows = {{0, 20, 4}, {2, 9, 3}, {3, 9, 3}, {1, 30, 6}};
    Machine precedences = new Machine(windows);
    assertThat(new UnaryRules(precedences.tasks).precedences(precedences.store)).isTrue();
    assertThat(precedences.earliestStarts()).containsExactly(0, 2, 3, 8);
    Machine edges = new Machine(windows);
    assertThat(new UnaryRules(edges.tasks).edges(edges.store)).isTrue();
    assertThat(edges.earliestStarts()).containsExactly(8, 2, 3, 8);
  }

  @Test
  void failsOnTooMuchWorkForAWindow() {
    Machine machine = new Machine(new int[] {0, 6, 3}, new int[] {1, 6, 2}, new int[] {1, 6, 2});
    assertThat(new UnaryRules(machine.tasks).overload(machine.store)).isFalse();
  }

  @Test
  void findsAnOptionalTaskAbsent_andLeavesItsTimesAlone() {
    Store s = new Store();
    Scope start = Scope.of(s.variable(0, 2), s.variable(0, 2), s.variable(0, 3));
    int there = s.variable(0, 1);
    TaskScope fixed = TaskScope.fixed(s, start, 3, 2, 2);
    long[] present = {Atom.TRUE, Atom.TRUE, Atom.ge(there, 1)};
    Scope durations = Scope.of(s, new int[3], new int[] {3, 2, 2});
    Scope ends =
        Scope.of(
            s, new int[] {start.handle(0), start.handle(1), start.handle(2)}, new int[] {3, 2, 2});
    assertThat(fixed.size()).isEqualTo(3);
    Network network = new Network(s);
    network.post(new NoOverlap(new TaskScope(start, durations, ends, present)), 0);
    assertThat(network.propagate()).isTrue();
    assertThat(s.max(there)).isZero();
    assertThat(start.min(s, 2)).isZero();
    assertThat(start.max(s, 2)).isEqualTo(3);
  }
}
