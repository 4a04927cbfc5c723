package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import java.util.stream.IntStream;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Wiring;

/**
 * The tuples of a table that are still valid: a sparse bit set whose words are cells of the store,
 * the words that are not yet zero in front.
 */
final class TupleSet {
  private final int tuples;
  private final int words;
  private final int[] order;
  private int firstCell;
  private int countCell;

  TupleSet(int tuples) {
    this.tuples = tuples;
    words = (tuples + 63) >>> 6;
    order = IntStream.range(0, words).toArray();
  }

  int words() {
    return words;
  }

  void attach(Wiring wiring) {
    firstCell = wiring.cell(words, -1L);
    countCell = wiring.cell(1, words);
    if (words > 0) {
      wiring.store().set(firstCell + words - 1, lastWord());
    }
  }

  /** All tuples, in a word array of the caller's. */
  void fill(long[] set) {
    Arrays.fill(set, -1L);
    if (words > 0) {
      set[words - 1] = lastWord();
    }
  }

  private long lastWord() {
    return -1L >>> (-tuples & 63);
  }

  boolean isEmpty(Store s) {
    return s.get(countCell) == 0;
  }

  /** Keeps the tuples in {@code mask}, or those that are not in it. */
  void intersect(Store s, long[] mask, boolean inside) {
    int count = (int) s.get(countCell);
    for (int k = count - 1; k >= 0; k--) {
      int w = order[k];
      long kept = s.get(firstCell + w) & (inside ? mask[w] : ~mask[w]);
      s.set(firstCell + w, kept);
      if (kept == 0) {
        order[k] = order[--count];
        order[count] = w;
      }
    }
    s.set(countCell, count);
  }

  /**
   * A word in which a valid tuple is in {@code set}, {@code guess} if possible; -1 if there is
   * none.
   */
  int meeting(Store s, long[] set, int guess) {
    if ((s.get(firstCell + guess) & set[guess]) != 0) {
      return guess;
    }
    int count = (int) s.get(countCell);
    for (int k = 0; k < count; k++) {
      int w = order[k];
      if ((s.get(firstCell + w) & set[w]) != 0) {
        return w;
      }
    }
    return -1;
  }
}
