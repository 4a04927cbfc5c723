package steelyard.adapters.engine.propagators;

/** Permutations that are kept sorted by keys which change little from run to run. */
final class Orders {
  private Orders() {}

  /** 0..n-1. */
  static int[] identity(int n) {
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
    return order;
  }

  /** Sorts by {@code key}, stably, by insertion: linear when nearly sorted. */
  static void sort(int[] order, int[] key) {
    for (int k = 1; k < order.length; k++) {
      int item = order[k];
      int at = k;
      while (at > 0 && key[order[at - 1]] > key[item]) {
        order[at] = order[at - 1];
        at--;
      }
      order[at] = item;
    }
  }
}
