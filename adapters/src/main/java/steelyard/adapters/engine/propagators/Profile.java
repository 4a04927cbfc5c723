package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * What the tasks of a cumulative resource use at each time whatever happens: the sum of the least
 * demands of the tasks that run then in any case, from their latest start to their earliest end. A
 * step function: segment k begins at its time and ends where the next begins.
 */
final class Profile {
  private final TaskScope tasks;
  private final Scope demands;
  private final int n;
  private final int[] byLatestStart;
  private final int[] byEarliestEnd;
  private final int[] latestStart;
  private final int[] earliestEnd;
  private final long[] demand;
  private final int[] time;
  private final long[] height;
  private int segments;

  Profile(TaskScope tasks, Scope demands) {
    this.tasks = tasks;
    this.demands = demands;
    n = tasks.size();
    byLatestStart = Orders.identity(n);
    byEarliestEnd = Orders.identity(n);
    latestStart = new int[n];
    earliestEnd = new int[n];
    demand = new long[n];
    time = new int[2 * n + 2];
    height = new long[2 * n + 2];
  }

  /** Makes the profile of the domains as they are. */
  void build(Store s) {
    for (int i = 0; i < n; i++) {
      latestStart[i] = tasks.latestStart(s, i);
      earliestEnd[i] = tasks.earliestEnd(s, i);
      boolean runs = tasks.presence(s, i) > 0 && latestStart[i] < earliestEnd[i];
      demand[i] = runs ? demands.min(s, i) : 0;
    }
    Orders.sort(byLatestStart, latestStart);
    Orders.sort(byEarliestEnd, earliestEnd);
    time[0] = -Store.LIMIT - 2;
    height[0] = 0;
    segments = 1;
    int starting = 0;
    for (int ending = 0; ending < n; ) {
      int end = byEarliestEnd[ending];
      if (starting < n && latestStart[byLatestStart[starting]] < earliestEnd[end]) {
        int start = byLatestStart[starting++];
        step(latestStart[start], demand[start]);
      } else {
        ending++;
        step(earliestEnd[end], -demand[end]);
      }
    }
    time[segments] = Store.LIMIT + 2;
  }

  private void step(int at, long change) {
    if (change == 0) {
      return;
    }
    if (time[segments - 1] != at) {
      time[segments] = at;
      height[segments] = height[segments - 1];
      segments++;
    }
    height[segments - 1] += change;
  }

  /** The greatest height. */
  long peak() {
    long peak = 0;
    for (int k = 0; k < segments; k++) {
      peak = Math.max(peak, height[k]);
    }
    return peak;
  }

  /**
   * The first time from task i's earliest start on at which it fits with its least demand and
   * duration under {@code capacity}; after its latest start if there is none.
   */
  long firstFit(Store s, int i, long capacity) {
    int duration = tasks.shortest(s, i);
    long room = capacity - demands.min(s, i);
    long start = tasks.earliestStart(s, i);
    int last = latestStart[i];
    for (int k = segmentAt((int) start); k < segments && time[k] < start + duration; k++) {
      if (heightWithout(i, k) > room) {
        start = time[k + 1];
        if (start > last) {
          return start;
        }
      }
    }
    return start;
  }

  /** Whether task i runs at some time in any case, with a demand. */
  boolean runs(int i) {
    return demand[i] > 0;
  }

  /** The most that task i, which {@link #runs}, can demand. */
  long roomFor(int i, long capacity) {
    long room = capacity;
    if (runs(i)) {
      for (int k = segmentAt(latestStart[i]); time[k] < earliestEnd[i]; k++) {
        room = Math.min(room, capacity - heightWithout(i, k));
      }
    }
    return room;
  }

  private long heightWithout(int i, int k) {
    return time[k] >= latestStart[i] && time[k] < earliestEnd[i]
        ? height[k] - demand[i]
        : height[k];
  }

  /** The segment that {@code at} lies in, by halving. */
  private int segmentAt(int at) {
    int low = 0;
    int high = segments - 1;
    while (low < high) {
      int middle = (low + high + 1) >>> 1;
      if (time[middle] <= at) {
        low = middle;
      } else {
        high = middle - 1;
      }
    }
    return low;
  }
}
