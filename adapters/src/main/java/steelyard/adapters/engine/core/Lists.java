package steelyard.adapters.engine.core;

import java.util.Arrays;

/** Lists of ints side by side, filled in the order of their index. */
final class Lists {
  private final int[] start;
  private int[] item = new int[64];
  private int size;
  private int current;

  Lists(int lists) {
    start = new int[lists + 1];
  }

  /** Appends to list {@code list}, which must not be before the one appended to last. */
  void add(int list, int value) {
    while (current < list) {
      start[++current] = size;
    }
    if (size == item.length) {
      item = Arrays.copyOf(item, 2 * size);
    }
    item[size++] = value;
  }

  /** Number of lists. */
  int count() {
    return start.length - 1;
  }

  int size(int list) {
    return end(list) - start(list);
  }

  int get(int list, int i) {
    return item[start(list) + i];
  }

  private int start(int list) {
    return list <= current ? start[list] : size;
  }

  private int end(int list) {
    return list < current ? start[list + 1] : size;
  }
}
