package steelyard.adapters.sat.encoding;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Clauses in memory, with unit propagation by its definition: slow, and nothing to get wrong. */
final class Clauses implements ClauseSink {
  private final List<int[]> all = new ArrayList<>();

  @Override
  public void clause(int[] literals, int size) {
    all.add(Arrays.copyOf(literals, size));
  }

  int size() {
    return all.size();
  }

  long literals() {
    return all.stream().mapToLong(clause -> clause.length).sum();
  }

  /**
   * What unit propagation makes of some literals: by variable 1, -1 or 0; empty on a conflict.
   * Constants may be among the literals.
   */
  Optional<int[]> propagate(int variables, int... literals) {
    int[] truth = new int[variables + 1];
    for (int literal : literals) {
      if (literal == Cnf.FALSE || (literal != Cnf.TRUE && !set(truth, literal))) {
        return Optional.empty();
      }
    }
    boolean changed = true;
    while (changed) {
      changed = false;
      for (int[] clause : all) {
        int[] open = Arrays.stream(clause).filter(l -> value(truth, l) >= 0).distinct().toArray();
        boolean isSatisfied = Arrays.stream(open).anyMatch(l -> value(truth, l) > 0);
        if (!isSatisfied && open.length == 0) {
          return Optional.empty();
        }
        if (!isSatisfied && open.length == 1) {
          changed = set(truth, open[0]);
        }
      }
    }
    return Optional.of(truth);
  }

  /** The truth of a literal: 1, -1, or 0 where it is open. */
  static int value(int[] truth, int literal) {
    if (literal == Cnf.TRUE || literal == Cnf.FALSE) {
      return literal == Cnf.TRUE ? 1 : -1;
    }
    return literal > 0 ? truth[literal] : -truth[-literal];
  }

  private static boolean set(int[] truth, int literal) {
    int value = literal > 0 ? 1 : -1;
    boolean agrees = truth[Math.abs(literal)] != -value;
    truth[Math.abs(literal)] = value;
    return agrees;
  }
}
