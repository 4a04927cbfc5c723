package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * Longs that are restored when the search goes back: a cell changed several times within one level
 * is saved once, by a stamp.
 */
final class Cells {
  private long[] value = new long[64];
  private int[] stamp = new int[64];
  private int cells;
  private int[] savedCell = new int[64];
  private long[] savedValue = new long[64];
  private int saved;
  private int[] levelTop = new int[64];
  private int magic = 1;

  /** Makes {@code count} cells side by side and returns the index of the first. */
  int make(int count, long initial) {
    int first = cells;
    cells += count;
    if (cells > value.length) {
      int room = Math.max(cells, 2 * value.length);
      value = Arrays.copyOf(value, room);
      stamp = Arrays.copyOf(stamp, room);
    }
    Arrays.fill(value, first, cells, initial);
    return first;
  }

  long get(int cell) {
    return value[cell];
  }

  void set(int cell, long to) {
    if (value[cell] == to) {
      return;
    }
    if (stamp[cell] != magic) {
      stamp[cell] = magic;
      save(cell);
    }
    value[cell] = to;
  }

  private void save(int cell) {
    if (saved == savedCell.length) {
      savedCell = Arrays.copyOf(savedCell, 2 * saved);
      savedValue = Arrays.copyOf(savedValue, 2 * saved);
    }
    savedCell[saved] = cell;
    savedValue[saved++] = value[cell];
  }

  /** Opens the level after {@code level}. */
  void push(int level) {
    if (level == levelTop.length) {
      levelTop = Arrays.copyOf(levelTop, 2 * level);
    }
    levelTop[level] = saved;
    renew();
  }

  /** Restores what held when {@code level} was current. */
  void popTo(int level) {
    int down = levelTop[level];
    while (saved > down) {
      saved--;
      value[savedCell[saved]] = savedValue[saved];
    }
    renew();
  }

  private void renew() {
    if (++magic == Integer.MAX_VALUE) {
      Arrays.fill(stamp, 0);
      magic = 1;
    }
  }
}
