package steelyard.adapters.engine.propagators;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Reason;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Stop;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.search.Limits;
import steelyard.adapters.engine.search.Ordered;
import steelyard.adapters.engine.search.Search;
import steelyard.adapters.engine.search.ValueOrder;
import steelyard.adapters.engine.search.VariableOrder;

/** What must hold of every propagator, checked against the enumeration of all assignments. */
final class SubjectChecks {
  private SubjectChecks() {}

  /** All of the checks below. */
  static void all(Subject subject, long seed) {
    findsExactlyTheSolutions(subject, seed);
    findsExactlyTheSolutionsUnderACondition(subject, seed);
    findsExactlyTheSolutionsWhereItForcesAFlag(subject, seed);
    reachesItsLevelAtTheRoot(subject, seed);
    explainsWhatItDoes(subject, seed);
  }

  /** The search finds exactly the assignments for which the relation holds, each once. */
  static void findsExactlyTheSolutions(Subject subject, long seed) {
    Bench bench = bench(subject, seed, false);
    subject.poster().post(bench.relations, bench.store, bench.scope, Atom.TRUE);
    expectSolutions(bench, seed, false, subject.rows(), subject::isSolution);
  }

  /** With a flag, {@code flag ⇒ relation} has exactly the solutions it should have. */
  static void findsExactlyTheSolutionsUnderACondition(Subject subject, long seed) {
    Bench bench = bench(subject, seed, false);
    long when = seed % 2 == 0 ? Atom.ge(bench.flag, 1) : Atom.le(bench.flag, 0);
    int on = seed % 2 == 0 ? 1 : 0;
    subject.poster().post(bench.relations, bench.store, bench.scope, when);
    Rows rows = withFlag(subject.rows());
    expectSolutions(
        bench,
        seed,
        true,
        rows,
        v -> v[v.length - 1] != on ? given(subject, v) : holds(subject, v));
  }

  /** {@code relation ⇒ flag} has exactly the solutions it should have. */
  static void findsExactlyTheSolutionsWhereItForcesAFlag(Subject subject, long seed) {
    if (subject.body().isEmpty()) {
      return;
    }
    Bench bench = bench(subject, seed, false);
    bench.relations.entails(
        0, subject.body().get().apply(bench.store, bench.scope), Atom.ge(bench.flag, 1));
    Rows rows = withFlag(subject.rows());
    expectSolutions(
        bench,
        seed,
        true,
        rows,
        v -> given(subject, v) && (v[v.length - 1] == 1 || !holds(subject, v)));
  }

  private static boolean holds(Subject subject, int[] valuesAndFlag) {
    return subject.isSolution(Arrays.copyOf(valuesAndFlag, valuesAndFlag.length - 1));
  }

  private static boolean given(Subject subject, int[] valuesAndFlag) {
    return subject.given().test(Arrays.copyOf(valuesAndFlag, valuesAndFlag.length - 1));
  }

  private static Rows withFlag(Rows rows) {
    return rows.and(Rows.of(Rows.range(0, 1)));
  }

  private static Bench bench(Subject subject, long seed, boolean learning) {
    Bench bench = new Bench(subject.rows(), new Random(seed), seed % 3 == 0, learning);
    subject.givenPoster().post(bench.relations, bench.store, bench.scope, Atom.TRUE);
    return bench;
  }

  private static void expectSolutions(
      Bench bench, long seed, boolean withFlag, Rows rows, Predicate<int[]> expected) {
    List<List<Integer>> found = new ArrayList<>();
    VariableOrder by = any(VariableOrder.values(), seed);
    ValueOrder pick = any(ValueOrder.values(), seed / 2);
    Scope all = bench.scope.and(Scope.of(bench.flag));
    Ordered brancher = new Ordered(bench.network, all, by, pick, seed);
    new Search(bench.network, brancher)
        .projectedOn(withFlag ? brancher : new Ordered(bench.network, bench.scope, by, pick, seed))
        .onSolution(s -> found.add(bench.solution(withFlag)))
        .run(Limits.NONE, Stop.NEVER);
    found.sort(Rows.LEXICOGRAPHIC);
    assertThat(found).isEqualTo(rows.solutions(expected));
  }

  private static <T> T any(T[] all, long seed) {
    return all[(int) (seed % all.length)];
  }

  /** The first fixpoint removes what the stated level promises, and never a value of a solution. */
  static void reachesItsLevelAtTheRoot(Subject subject, long seed) {
    Bench bench = bench(subject, seed, false);
    subject.poster().post(bench.relations, bench.store, bench.scope, Atom.TRUE);
    boolean consistent = bench.network.propagate();
    List<Set<Integer>> wanted = subject.rows().supported(subject::isSolution);
    if (!consistent) {
      assertThat(wanted).allMatch(Set::isEmpty);
      return;
    }
    Rows domains = bench.domains();
    for (int i = 0; i < domains.size(); i++) {
      Set<Integer> left = new TreeSet<>(IntStream.of(domains.row(i)).boxed().toList());
      assertThat(left).as("row %d", i).containsAll(wanted.get(i));
      if (subject.level() == Subject.Level.DOMAIN) {
        assertThat(left).as("row %d", i).isEqualTo(wanted.get(i));
      }
    }
    if (subject.level() == Subject.Level.BOUNDS) {
      List<Set<Integer>> supported = domains.filled().supported(subject::isSolution);
      for (int i = 0; i < domains.size(); i++) {
        assertThat(supported.get(i))
            .as("bounds of row %d", i)
            .contains(domains.min(i), domains.max(i));
      }
    }
  }

  /**
   * Every explanation, asked for late, consists of atoms that were true before the change and
   * implies it within the first domains by the relation alone.
   */
  static void explainsWhatItDoes(Subject subject, long seed) {
    Random random = new Random(seed);
    Bench bench = bench(subject, seed, true);
    subject.poster().post(bench.relations, bench.store, bench.scope, Atom.TRUE);
    int posted = bench.store.now();
    boolean consistent = bench.network.propagate();
    while (consistent) {
      int row = openRow(bench, random);
      if (row < 0) {
        break;
      }
      int value = bench.scope.min(bench.store, row) + (random.nextBoolean() ? 0 : 1);
      bench.store.push();
      consistent = bench.network.propagate(bench.scope.le(row, value));
    }
    if (!consistent) {
      Reason conflict = new Reason();
      bench.network.explainConflict(conflict);
      checkReason(subject, bench, conflict, bench.store.now(), Atom.FALSE);
    }
    bench.store.popTo(bench.store.level() / 2);
    for (int time = posted; time < bench.store.now(); time++) {
      if (bench.network.explains(time)) {
        Reason out = new Reason();
        bench.network.explain(time, out);
        checkReason(subject, bench, out, time, bench.network.changed(time));
      }
    }
  }

  private static int openRow(Bench bench, Random random) {
    int[] open =
        IntStream.range(0, bench.scope.size())
            .filter(i -> !bench.scope.fixed(bench.store, i))
            .toArray();
    return open.length == 0 ? -1 : open[random.nextInt(open.length)];
  }

  private static void checkReason(Subject subject, Bench bench, Reason out, int time, long atom) {
    if (!out.known()) {
      return;
    }
    for (int i = 0; i < out.size(); i++) {
      assertThat(trueBefore(bench.store, out.get(i), time))
          .as("%s before %d", Atom.show(out.get(i)), time)
          .isTrue();
    }
    List<List<Integer>> counterexamples =
        subject
            .rows()
            .solutions(
                values ->
                    subject.isSolution(values)
                        && satisfiesAll(bench, out, values)
                        && !satisfies(bench, atom, values));
    assertThat(counterexamples).as("against the reason for %s", Atom.show(atom)).isEmpty();
  }

  private static boolean trueBefore(Store s, long atom, int time) {
    int h = Atom.handle(atom);
    int k = Atom.value(atom);
    if (Atom.isBound(atom)) {
      return s.minAt(h, time) >= k;
    }
    return Atom.isUnequal(atom)
        ? s.excludedAt(h, k, time)
        : s.minAt(h, time) == k && s.maxAt(h, time) == k;
  }

  private static boolean satisfiesAll(Bench bench, Reason out, int[] values) {
    for (int i = 0; i < out.size(); i++) {
      if (!satisfies(bench, out.get(i), values)) {
        return false;
      }
    }
    return true;
  }

  /** Whether the atom holds when the rows have these values. */
  private static boolean satisfies(Bench bench, long atom, int[] values) {
    if (atom == Atom.FALSE) {
      return false;
    }
    for (int i = 0; i < values.length; i++) {
      int h = bench.scope.handle(i);
      if (h >> 1 == Atom.variable(atom)) {
        int ofHandle = values[i] - bench.scope.offset(i);
        int ofAtom = h == Atom.handle(atom) ? ofHandle : -ofHandle;
        int k = Atom.value(atom);
        return Atom.isBound(atom) ? ofAtom >= k : Atom.isUnequal(atom) ? ofAtom != k : ofAtom == k;
      }
    }
    throw new AssertionError(Atom.show(atom) + " is not about the scope");
  }
}
