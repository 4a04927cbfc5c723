package steelyard.adapters.engine.propagators;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.function.Predicate;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * Random tasks for tests, laid out in rows: a start each, and where it is not a constant a duration
 * with an end, and where the task is optional a presence.
 */
final class RandomTasks {
  private static final int NONE = -1;

  private final List<int[]> rows = new ArrayList<>();
  private final int[] startRow;
  private final int[] durationRow;
  private final int[] fixedDuration;
  private final int[] endRow;
  private final int[] presenceRow;

  RandomTasks(Random random, int n, int horizon, int longest, boolean flexible) {
    startRow = new int[n];
    durationRow = new int[n];
    fixedDuration = new int[n];
    endRow = new int[n];
    presenceRow = new int[n];
    Rows starts = Rows.random(random, n, 0, horizon, 5);
    for (int i = 0; i < n; i++) {
      startRow[i] = add(starts.row(i));
      durationRow[i] = NONE;
      endRow[i] = NONE;
      presenceRow[i] = NONE;
      fixedDuration[i] = random.nextInt(longest + 1);
      if (flexible && i == 0) {
        int least = random.nextInt(2);
        durationRow[i] = add(Rows.range(least, least + 1));
        endRow[i] = add(Rows.range(starts.min(i) + least, starts.max(i) + least + 1));
      }
      if (flexible && random.nextInt(3) == 0) {
        presenceRow[i] = add(Rows.range(0, 1));
      }
    }
  }

  /** Adds a row of another kind and returns its index. */
  int add(int[] row) {
    rows.add(row);
    return rows.size() - 1;
  }

  Rows rows() {
    return Rows.of(rows.toArray(new int[0][]));
  }

  int start(int[] values, int i) {
    return values[startRow[i]];
  }

  int end(int[] values, int i) {
    return endRow[i] == NONE ? start(values, i) + fixedDuration[i] : values[endRow[i]];
  }

  boolean present(int[] values, int i) {
    return presenceRow[i] == NONE || values[presenceRow[i]] == 1;
  }

  /** That start + duration = end wherever that is not so by construction. */
  Predicate<int[]> linked() {
    return values -> {
      for (int i = 0; i < startRow.length; i++) {
        if (endRow[i] != NONE
            && values[startRow[i]] + values[durationRow[i]] != values[endRow[i]]) {
          return false;
        }
      }
      return true;
    };
  }

  void postLinks(Relations relations, Store s, Scope x) {
    for (int i = 0; i < startRow.length; i++) {
      if (endRow[i] != NONE) {
        Scope parts = row(x, startRow[i]).and(row(x, durationRow[i])).and(row(x, endRow[i]));
        relations.equal(0, Atom.TRUE, Sum.of(s, new long[] {1, 1, -1}, parts), 0);
      }
    }
  }

  TaskScope tasks(Store s, Scope x) {
    Scope starts = Scope.empty();
    Scope durations = Scope.empty();
    Scope ends = Scope.empty();
    long[] present = new long[startRow.length];
    for (int i = 0; i < present.length; i++) {
      Scope start = row(x, startRow[i]);
      starts = starts.and(start);
      boolean fixed = endRow[i] == NONE;
      durations = durations.and(fixed ? constant(s, fixedDuration[i]) : row(x, durationRow[i]));
      ends = ends.and(fixed ? shifted(s, start, fixedDuration[i]) : row(x, endRow[i]));
      present[i] = presenceRow[i] == NONE ? Atom.TRUE : x.ge(presenceRow[i], 1);
    }
    return new TaskScope(starts, durations, ends, present);
  }

  static Scope row(Scope x, int i) {
    return x.rows(i, i + 1);
  }

  static Scope constant(Store s, int value) {
    return Scope.of(s, new int[] {Store.ZERO}, new int[] {value});
  }

  private static Scope shifted(Store s, Scope row, int by) {
    return Scope.of(s, new int[] {row.handle(0)}, new int[] {row.offset(0) + by});
  }
}
