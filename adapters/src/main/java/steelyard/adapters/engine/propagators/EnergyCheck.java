package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * Overload checking of a cumulative resource: the tasks that must end by some time need more
 * energy, that is duration times demand, than the resource has by then. An optional task that would
 * overload is absent.
 *
 * <p>The earliest end of a set is kept in a {@link ThetaTree} in units of energy: time t is {@code
 * capacity·t}. Cost: n log n. Left out where energies could pass 2^60.
 *
 * <p>Source: Wolf and Schrader (2006), O(n log n) overload checking for the cumulative constraint
 * and its application, INAP 2005, LNCS 4369:88-101; Vilím (2009), Max energy filtering algorithm
 * for discrete cumulative resources, CPAIOR, LNCS 5547:294-308.
 */
final class EnergyCheck {
  private static final double MOST = 1L << 60;

  private final TaskScope tasks;
  private final Scope demands;
  private final Scope capacity;
  private final boolean safe;
  private final ThetaTree tree;
  private final int[] byEarliestStart;
  private final int[] byLatestEnd;
  private final int[] leaf;
  private final int[] earliestStart;
  private final int[] latestEnd;

  EnergyCheck(Store s, TaskScope tasks, Scope demands, Scope capacity) {
    this.tasks = tasks;
    this.demands = demands;
    this.capacity = capacity;
    int n = tasks.size();
    safe = safe(s);
    tree = new ThetaTree(n);
    byEarliestStart = Orders.identity(n);
    byLatestEnd = Orders.identity(n);
    leaf = new int[n];
    earliestStart = new int[n];
    latestEnd = new int[n];
  }

  private boolean safe(Store s) {
    double work = 0;
    double reach = 0;
    for (int i = 0; i < tasks.size(); i++) {
      work += (double) tasks.longest(s, i) * demands.max(s, i);
      reach = Math.max(reach, Math.abs((double) tasks.earliestStart(s, i)));
      reach = Math.max(reach, Math.abs((double) tasks.latestEnd(s, i)));
    }
    return work + reach * Math.max(0, capacity.max(s, 0)) < MOST;
  }

  /** False: overload. */
  boolean check(Store s) {
    long most = capacity.max(s, 0);
    if (!safe || most < 0) {
      return true;
    }
    load(s);
    for (int i : byLatestEnd) {
      int presence = tasks.presence(s, i);
      long energy = (long) tasks.shortest(s, i) * demands.min(s, i);
      long due = most * latestEnd[i];
      if (presence > 0 && energy > 0) {
        tree.add(leaf[i], most * earliestStart[i], energy);
        if (tree.end() > due) {
          return s.fail(0);
        }
      } else if (presence == 0 && energy > 0) {
        tree.addOptional(leaf[i], most * earliestStart[i], energy);
      }
      while (tree.optionalEnd() > due) {
        int task = byEarliestStart[tree.responsible()];
        tree.remove(leaf[task]);
        if (!tasks.forbid(s, task)) {
          return false;
        }
      }
    }
    return true;
  }

  private void load(Store s) {
    for (int i = 0; i < leaf.length; i++) {
      earliestStart[i] = tasks.earliestStart(s, i);
      latestEnd[i] = tasks.latestEnd(s, i);
    }
    Orders.sort(byEarliestStart, earliestStart);
    Orders.sort(byLatestEnd, latestEnd);
    for (int k = 0; k < leaf.length; k++) {
      leaf[byEarliestStart[k]] = k;
    }
    tree.clear();
  }
}
