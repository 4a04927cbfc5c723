package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Store;

/**
 * The rules of a resource that does one task at a time, as far as they raise earliest starts or
 * find a conflict; the mirrored tasks give the rest.
 *
 * <p>Only tasks that are there move; others are optional, and are found absent where they cannot be
 * added. A task of duration 0 takes part: it may not lie strictly inside another.
 *
 * <p>Source: Vilím (2004) and Vilím, Barták and Čepek (2005), as for {@link ThetaTree}; Vilím
 * (2007), Global constraints in scheduling, thesis, Charles University, Prague.
 */
final class UnaryRules {
  private final TaskScope tasks;
  private final int n;
  private final ThetaTree tree;
  private final int[] byEarliestStart;
  private final int[] byLatestStart;
  private final int[] byEarliestEnd;
  private final int[] byLatestEnd;
  private final int[] leaf;
  private final int[] presence;
  private final int[] earliestStart;
  private final int[] latestStart;
  private final int[] earliestEnd;
  private final int[] latestEnd;
  private final int[] duration;
  private final long[] bound;

  UnaryRules(TaskScope tasks) {
    this.tasks = tasks;
    n = tasks.size();
    tree = new ThetaTree(n);
    byEarliestStart = Orders.identity(n);
    byLatestStart = Orders.identity(n);
    byEarliestEnd = Orders.identity(n);
    byLatestEnd = Orders.identity(n);
    leaf = new int[n];
    presence = new int[n];
    earliestStart = new int[n];
    latestStart = new int[n];
    earliestEnd = new int[n];
    latestEnd = new int[n];
    duration = new int[n];
    bound = new long[n];
  }

  private void load(Store s) {
    for (int i = 0; i < n; i++) {
      presence[i] = tasks.presence(s, i);
      earliestStart[i] = tasks.earliestStart(s, i);
      latestStart[i] = tasks.latestStart(s, i);
      earliestEnd[i] = tasks.earliestEnd(s, i);
      latestEnd[i] = tasks.latestEnd(s, i);
      duration[i] = tasks.shortest(s, i);
      bound[i] = ThetaTree.NEVER;
    }
    Orders.sort(byEarliestStart, earliestStart);
    for (int k = 0; k < n; k++) {
      leaf[byEarliestStart[k]] = k;
    }
    tree.clear();
  }

  private void add(int i) {
    tree.add(leaf[i], earliestStart[i], duration[i]);
  }

  private void addOptional(int i) {
    tree.addOptional(leaf[i], earliestStart[i], duration[i]);
  }

  /** The earliest end of the set without task i, which may be in it. */
  private long endWithout(int i, boolean inSet) {
    if (!inSet) {
      return tree.end();
    }
    tree.remove(leaf[i]);
    long end = tree.end();
    add(i);
    return end;
  }

  /**
   * Overload: the tasks that must end by some time cannot all be done by then. An optional task
   * that would overload is absent.
   */
  boolean overload(Store s) {
    load(s);
    Orders.sort(byLatestEnd, latestEnd);
    for (int i : byLatestEnd) {
      if (presence[i] > 0) {
        add(i);
        if (tree.end() > latestEnd[i]) {
          return s.fail(0);
        }
      } else if (presence[i] == 0) {
        addOptional(i);
      }
      while (tree.optionalEnd() > latestEnd[i]) {
        int task = byEarliestStart[tree.responsible()];
        tree.remove(leaf[task]);
        if (!tasks.forbid(s, task)) {
          return false;
        }
      }
    }
    return true;
  }

  /**
   * Detectable precedences: what cannot come after task i comes before it, and i starts when all of
   * that is done.
   */
  boolean precedences(Store s) {
    load(s);
    Orders.sort(byEarliestEnd, earliestEnd);
    Orders.sort(byLatestStart, latestStart);
    int next = 0;
    for (int i : byEarliestEnd) {
      if (presence[i] <= 0) {
        continue;
      }
      while (next < n && earliestEnd[i] > latestStart[byLatestStart[next]]) {
        int j = byLatestStart[next++];
        if (presence[j] > 0) {
          add(j);
        }
      }
      bound[i] = endWithout(i, earliestEnd[i] > latestStart[i]);
    }
    return startFromBounds(s);
  }

  /** Not last: if i cannot start after some set is done, it ends before one of the set starts. */
  boolean notLast(Store s) {
    load(s);
    Orders.sort(byLatestEnd, latestEnd);
    Orders.sort(byLatestStart, latestStart);
    int next = 0;
    int newest = -1;
    int second = -1;
    for (int i : byLatestEnd) {
      if (presence[i] <= 0) {
        continue;
      }
      while (next < n && latestEnd[i] > latestStart[byLatestStart[next]]) {
        int j = byLatestStart[next++];
        if (presence[j] > 0) {
          add(j);
          second = newest;
          newest = j;
        }
      }
      if (endWithout(i, latestEnd[i] > latestStart[i]) > latestStart[i]) {
        int other = newest == i ? second : newest;
        bound[i] = latestStart[other];
      }
    }
    for (int i = 0; i < n; i++) {
      if (bound[i] != ThetaTree.NEVER && !tasks.endsBy(s, i, bound[i])) {
        return false;
      }
    }
    return true;
  }

  /**
   * Edge finding: if a set cannot be done by its time with i before its end, i comes after all of
   * it.
   */
  boolean edges(Store s) {
    load(s);
    Orders.sort(byLatestEnd, latestEnd);
    int present = 0;
    for (int i = 0; i < n; i++) {
      if (presence[i] > 0) {
        add(i);
        present++;
      }
    }
    for (int k = n - 1; k >= 0 && present > 1; k--) {
      int j = byLatestEnd[k];
      if (presence[j] <= 0) {
        continue;
      }
      if (tree.end() > latestEnd[j]) {
        return s.fail(0);
      }
      addOptional(j);
      present--;
      int due = latestEnd[byLatestEnd[previousPresent(k)]];
      while (tree.optionalEnd() > due && tree.responsible() >= 0) {
        int i = byEarliestStart[tree.responsible()];
        bound[i] = Math.max(bound[i], tree.end());
        tree.remove(leaf[i]);
      }
    }
    return startFromBounds(s);
  }

  private int previousPresent(int from) {
    int k = from - 1;
    while (presence[byLatestEnd[k]] <= 0) {
      k--;
    }
    return k;
  }

  private boolean startFromBounds(Store s) {
    for (int i = 0; i < n; i++) {
      if (bound[i] > earliestStart[i] && !tasks.startsFrom(s, i, bound[i])) {
        return false;
      }
    }
    return true;
  }
}
