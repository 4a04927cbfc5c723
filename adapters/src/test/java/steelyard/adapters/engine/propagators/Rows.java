package steelyard.adapters.engine.propagators;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.Consumer;
import java.util.function.Predicate;
import java.util.stream.IntStream;

/** Domains for tests, ascending values each, and all assignments within them. */
final class Rows {
  /** Orders assignments as {@link #assignments} visits them. */
  static final Comparator<List<Integer>> LEXICOGRAPHIC =
      (a, b) -> {
        int i = 0;
        while (i < a.size() - 1 && a.get(i).equals(b.get(i))) {
          i++;
        }
        return Integer.compare(a.get(i), b.get(i));
      };

  private final int[][] rows;

  private Rows(int[][] rows) {
    this.rows = rows;
  }

  static Rows of(int[]... rows) {
    return new Rows(rows);
  }

  /**
   * n domains of one to {@code most} values each, from {@code low} to {@code high}, some with
   * holes.
   */
  static Rows random(Random random, int n, int low, int high, int most) {
    int[][] rows = new int[n][];
    for (int i = 0; i < n; i++) {
      rows[i] =
          random.nextInt(3) == 0 ? set(random, low, high, most) : range(random, low, high, most);
    }
    return new Rows(rows);
  }

  private static int[] set(Random random, int low, int high, int most) {
    Set<Integer> values = new TreeSet<>();
    int draws = 1 + random.nextInt(most);
    for (int k = 0; k < draws; k++) {
      values.add(low + random.nextInt(high - low + 1));
    }
    return values.stream().mapToInt(Integer::intValue).toArray();
  }

  private static int[] range(Random random, int low, int high, int most) {
    int size = 1 + random.nextInt(Math.min(most, high - low + 1));
    int first = low + random.nextInt(high - low + 2 - size);
    return range(first, first + size - 1);
  }

  /** All ints from {@code low} to {@code high}. */
  static int[] range(int low, int high) {
    return IntStream.rangeClosed(low, high).toArray();
  }

  int size() {
    return rows.length;
  }

  int[] row(int i) {
    return rows[i];
  }

  int min(int i) {
    return rows[i][0];
  }

  int max(int i) {
    return rows[i][rows[i].length - 1];
  }

  /** These rows and then the rows of {@code more}. */
  Rows and(Rows more) {
    int[][] all = Arrays.copyOf(rows, rows.length + more.rows.length);
    System.arraycopy(more.rows, 0, all, rows.length, more.rows.length);
    return new Rows(all);
  }

  /** The rows without holes. */
  Rows filled() {
    int[][] filled = new int[rows.length][];
    for (int i = 0; i < filled.length; i++) {
      filled[i] = range(min(i), max(i));
    }
    return new Rows(filled);
  }

  /** Shows each assignment to {@code visitor}; the array is reused. */
  void assignments(Consumer<int[]> visitor) {
    visit(new int[rows.length], 0, visitor);
  }

  private void visit(int[] values, int i, Consumer<int[]> visitor) {
    if (i == rows.length) {
      visitor.accept(values);
      return;
    }
    for (int value : rows[i]) {
      values[i] = value;
      visit(values, i + 1, visitor);
    }
  }

  /** The assignments for which {@code holds}, in lexicographic order. */
  List<List<Integer>> solutions(Predicate<int[]> holds) {
    List<List<Integer>> solutions = new ArrayList<>();
    assignments(
        values -> {
          if (holds.test(values)) {
            solutions.add(IntStream.of(values).boxed().toList());
          }
        });
    return solutions;
  }

  /** The values of each row in those assignments. */
  List<Set<Integer>> supported(Predicate<int[]> holds) {
    List<Set<Integer>> sets = new ArrayList<>();
    for (int i = 0; i < rows.length; i++) {
      sets.add(new TreeSet<>());
    }
    for (List<Integer> solution : solutions(holds)) {
      for (int i = 0; i < rows.length; i++) {
        sets.get(i).add(solution.get(i));
      }
    }
    return sets;
  }
}
