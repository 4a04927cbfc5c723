package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Wiring;

/**
 * Tasks in time, column by column; task i is there where {@code present[i]} is true.
 *
 * <p>That start + duration = end is posted apart, for absent tasks too. Nothing is ever removed
 * from the times of a task that may be absent: what is certain is that it is absent if it cannot be
 * placed.
 */
public final class TaskScope {
  private final Scope start;
  private final Scope duration;
  private final Scope end;
  private final long[] present;

  /** Rows of four columns; durations are at least 0. */
  public TaskScope(Scope start, Scope duration, Scope end, long[] present) {
    int n = start.size();
    if (duration.size() != n || end.size() != n || present.length != n) {
      throw new IllegalArgumentException("columns of tasks differ in length");
    }
    this.start = start;
    this.duration = duration;
    this.end = end;
    this.present = present.clone();
  }

  /** Tasks of fixed durations that are always there. */
  public static TaskScope fixed(Store s, Scope start, int... durations) {
    int n = start.size();
    int[] zero = new int[n];
    int[] handle = new int[n];
    int[] endOffset = new int[n];
    long[] always = new long[n];
    for (int i = 0; i < n; i++) {
      handle[i] = start.handle(i);
      endOffset[i] = start.offset(i) + durations[i];
      always[i] = Atom.TRUE;
    }
    return new TaskScope(
        start, Scope.of(s, zero, durations), Scope.of(s, handle, endOffset), always);
  }

  /** The tasks with time running backwards: starts are negated ends. */
  public TaskScope mirrored() {
    return new TaskScope(end.negated(), duration, start.negated(), present);
  }

  /** Number of tasks. */
  public int size() {
    return present.length;
  }

  void attach(Wiring wiring) {
    wiring.onBounds(start);
    wiring.onBounds(end);
    for (int i = 0; i < present.length; i++) {
      wiring.onMin(duration.handle(i));
      wiring.onAtom(present[i]);
    }
  }

  /** 1 if task i is there, -1 if it is not, 0 if that is open. */
  int presence(Store s, int i) {
    return s.truth(present[i]);
  }

  boolean forbid(Store s, int i) {
    return s.require(Atom.not(present[i]), 0);
  }

  int earliestStart(Store s, int i) {
    return start.min(s, i);
  }

  int latestStart(Store s, int i) {
    return start.max(s, i);
  }

  int earliestEnd(Store s, int i) {
    return end.min(s, i);
  }

  int latestEnd(Store s, int i) {
    return end.max(s, i);
  }

  int shortest(Store s, int i) {
    return duration.min(s, i);
  }

  int longest(Store s, int i) {
    return duration.max(s, i);
  }

  boolean startsFrom(Store s, int i, long time) {
    return start.setMin(s, i, (int) Math.min(time, Store.LIMIT + 1L), 0);
  }

  boolean endsBy(Store s, int i, long time) {
    return end.setMax(s, i, (int) Math.max(time, -Store.LIMIT - 1L), 0);
  }

  boolean lastsAtMost(Store s, int i, int time) {
    return duration.setMax(s, i, time, 0);
  }

  /** Whether task i is absent, or there with nothing open. */
  boolean settled(Store s, int i) {
    int there = presence(s, i);
    return there < 0 || (there > 0 && start.fixed(s, i) && duration.fixed(s, i) && end.fixed(s, i));
  }
}
