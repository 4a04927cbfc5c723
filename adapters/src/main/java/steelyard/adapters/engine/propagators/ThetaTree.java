package steelyard.adapters.engine.propagators;

import java.util.Arrays;

/**
 * The earliest time at which a set of tasks can be done one after the other, kept while tasks are
 * added and taken away; and the same with at most one more of a second set, the optional ones.
 *
 * <p>Leaves stand in the order of earliest starts. A node knows the work below it and the earliest
 * end of the tasks below it; with Θ the set, {@code end(Θ) = max over Ω ⊆ Θ of (least start of Ω +
 * work of Ω)}. Cost: log n per change.
 *
 * <p>Source: Vilím (2004), O(n log n) filtering algorithms for unary resource constraint, CPAIOR,
 * LNCS 3011:335-347; Vilím, Barták and Čepek (2005), Extension of O(n log n) filtering algorithms
 * for the unary resource constraint to optional activities, Constraints 10:403-425.
 */
final class ThetaTree {
  /** The end of no task at all; so small that work can be added to it. */
  static final long NEVER = Long.MIN_VALUE / 4;

  private static final int NONE = -1;

  private final int leaves;
  private final long[] work;
  private final long[] end;
  private final long[] optionalWork;
  private final long[] optionalEnd;
  private final int[] workBy;
  private final int[] endBy;

  /** A tree with room for n tasks, empty. */
  ThetaTree(int n) {
    leaves = Integer.highestOneBit(Math.max(1, 2 * n - 1));
    int nodes = 2 * leaves;
    work = new long[nodes];
    end = new long[nodes];
    optionalWork = new long[nodes];
    optionalEnd = new long[nodes];
    workBy = new int[nodes];
    endBy = new int[nodes];
    clear();
  }

  void clear() {
    Arrays.fill(work, 0);
    Arrays.fill(end, NEVER);
    Arrays.fill(optionalWork, 0);
    Arrays.fill(optionalEnd, NEVER);
    Arrays.fill(workBy, NONE);
    Arrays.fill(endBy, NONE);
  }

  /** Puts a task into the set. */
  void add(int leaf, long start, long duration) {
    int node = leaves + leaf;
    work[node] = duration;
    end[node] = start + duration;
    optionalWork[node] = work[node];
    optionalEnd[node] = end[node];
    workBy[node] = NONE;
    endBy[node] = NONE;
    mend(node);
  }

  /** Puts a task among the optional ones, out of the set if it was there. */
  void addOptional(int leaf, long start, long duration) {
    int node = leaves + leaf;
    work[node] = 0;
    end[node] = NEVER;
    optionalWork[node] = duration;
    optionalEnd[node] = start + duration;
    workBy[node] = leaf;
    endBy[node] = leaf;
    mend(node);
  }

  /** Takes a task away, wherever it was. */
  void remove(int leaf) {
    int node = leaves + leaf;
    work[node] = 0;
    end[node] = NEVER;
    optionalWork[node] = 0;
    optionalEnd[node] = NEVER;
    workBy[node] = NONE;
    endBy[node] = NONE;
    mend(node);
  }

  private void mend(int changed) {
    for (int node = changed >> 1; node > 0; node >>= 1) {
      int left = 2 * node;
      int right = left + 1;
      work[node] = work[left] + work[right];
      end[node] = Math.max(end[right], end[left] + work[right]);
      mendOptional(node, left, right);
    }
  }

  private void mendOptional(int node, int left, int right) {
    long byLeft = optionalWork[left] + work[right];
    long byRight = work[left] + optionalWork[right];
    boolean takeLeft = byLeft > byRight;
    optionalWork[node] = takeLeft ? byLeft : byRight;
    workBy[node] = takeLeft ? workBy[left] : workBy[right];
    optionalEnd[node] = optionalEnd[right];
    endBy[node] = endBy[right];
    if (end[left] + optionalWork[right] > optionalEnd[node]) {
      optionalEnd[node] = end[left] + optionalWork[right];
      endBy[node] = workBy[right];
    }
    if (optionalEnd[left] + work[right] > optionalEnd[node]) {
      optionalEnd[node] = optionalEnd[left] + work[right];
      endBy[node] = endBy[left];
    }
  }

  /** The earliest end of the set; below any time if it is empty. */
  long end() {
    return end[1];
  }

  /** The earliest end of the set and that optional task which makes it latest, if any does. */
  long optionalEnd() {
    return optionalEnd[1];
  }

  /** The leaf of that optional task; -1 if the set alone is as late. */
  int responsible() {
    return endBy[1];
  }

  /** The work of the set. */
  long work() {
    return work[1];
  }
}
