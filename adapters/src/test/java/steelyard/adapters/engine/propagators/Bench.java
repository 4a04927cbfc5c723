package steelyard.adapters.engine.propagators;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * A store and network over given rows, for tests. Each row is a variable seen through a random sign
 * and offset; a wide bench makes variables of 10^5 values and narrows them, so that holes are kept
 * sparsely.
 */
final class Bench {
  final Store store;
  final Network network;
  final Relations relations;
  final Scope scope;
  final int flag;

  Bench(Rows rows, Random random, boolean wide, boolean learning) {
    store = new Store(learning);
    network = new Network(store);
    relations = new Relations(network);
    int[] handles = new int[rows.size()];
    int[] offsets = new int[rows.size()];
    for (int i = 0; i < rows.size(); i++) {
      boolean mirrored = random.nextBoolean();
      offsets[i] = random.nextInt(21) - 10;
      handles[i] = variable(rows.row(i), mirrored, offsets[i], wide) + (mirrored ? 1 : 0);
    }
    scope = Scope.of(store, handles, offsets);
    flag = store.variable(0, 1);
  }

  private int variable(int[] row, boolean mirrored, int offset, boolean wide) {
    int[] values =
        IntStream.of(row).map(v -> mirrored ? offset - v : v - offset).sorted().toArray();
    int least = values[0];
    int greatest = values[values.length - 1];
    int margin = wide ? 50_000 : 0;
    int h = store.variable(least - margin, greatest + margin);
    boolean consistent = store.setMin(h, least, 0) && store.setMax(h, greatest, 0);
    for (int v = least; v <= greatest; v++) {
      int value = v;
      if (IntStream.of(values).noneMatch(x -> x == value)) {
        consistent &= store.remove(h, v, 0);
      }
    }
    if (!consistent) {
      throw new AssertionError("the rows make no domains");
    }
    return h;
  }

  /** What the rows can still be. */
  Rows domains() {
    int[][] domains = new int[scope.size()][];
    for (int i = 0; i < domains.length; i++) {
      int row = i;
      domains[i] =
          IntStream.rangeClosed(scope.min(store, i), scope.max(store, i))
              .filter(v -> scope.has(store, row, v))
              .toArray();
    }
    return Rows.of(domains);
  }

  /** The values of the rows, all fixed, and of the flag if wanted. */
  List<Integer> solution(boolean withFlag) {
    List<Integer> values = new ArrayList<>();
    for (int i = 0; i < scope.size(); i++) {
      values.add(scope.min(store, i));
    }
    if (withFlag) {
      values.add(store.min(flag));
    }
    return values;
  }
}
