package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * Values removed from the inside of domains.
 *
 * <p>A variable created with at most {@link #DENSE} values gets a bit per value at its first hole;
 * a wider one keeps each hole in a hash set shared by all, chained so that the newest hole is the
 * head of its chain and going back in time is popping. Either way a removed value stays removed
 * until the search goes back; nothing is approximated but {@link #size} of wide domains.
 */
final class Holes {
  /** Widest domain, in values at creation, that is kept as bits. */
  static final int DENSE = 4096;

  private static final int NONE = -1;

  private final boolean learning;
  private int[] base = new int[64];
  private int[] width = new int[64];
  private int[] bitsAt = new int[64];
  private int[] count = new int[64];
  private long[] bits = new long[64];
  private int words;
  private int[] removedAt = new int[0];

  private long[] sparse = new long[64];
  private int[] sparseTime = new int[64];
  private int[] chain = new int[64];
  private int[] head = new int[64];
  private int sparseCount;

  Holes(boolean learning) {
    this.learning = learning;
    Arrays.fill(head, NONE);
  }

  /** Makes room for variable v, created with the values {@code min..max}. */
  void variable(int v, int min, int max) {
    if (v == base.length) {
      base = Arrays.copyOf(base, 2 * v);
      width = Arrays.copyOf(width, 2 * v);
      bitsAt = Arrays.copyOf(bitsAt, 2 * v);
      count = Arrays.copyOf(count, 2 * v);
    }
    base[v] = min;
    width[v] = (int) Math.min((long) max - min + 1, DENSE + 1);
    bitsAt[v] = NONE;
  }

  /** Whether v has any hole at all; one inside former bounds counts too. */
  boolean any(int v) {
    return count[v] != 0;
  }

  /** Whether {@code value}, which lies between the bounds at creation, is a hole of v. */
  boolean has(int v, int value) {
    if (count[v] == 0) {
      return false;
    }
    if (bitsAt[v] >= 0) {
      int bit = value - base[v];
      return (bits[bitsAt[v] + (bit >>> 6)] >>> bit & 1) == 0;
    }
    return find(v, value) >= 0;
  }

  /** Makes {@code value}, no hole so far, a hole of v at the given time. */
  void add(int v, int value, int time) {
    if (width[v] <= DENSE) {
      if (bitsAt[v] < 0) {
        makeBits(v);
      }
      int bit = value - base[v];
      bits[bitsAt[v] + (bit >>> 6)] &= ~(1L << bit);
      if (learning) {
        removedAt[(bitsAt[v] << 6) + bit] = time;
      }
    } else {
      addSparse(v, value, time);
    }
    count[v]++;
  }

  /** Undoes the newest {@link #add} that is still in force. */
  void undo(int v, int value) {
    if (bitsAt[v] >= 0) {
      int bit = value - base[v];
      bits[bitsAt[v] + (bit >>> 6)] |= 1L << bit;
    } else {
      sparseCount--;
      head[bucket(sparse[sparseCount])] = chain[sparseCount];
    }
    count[v]--;
  }

  /** The time at which {@code value} became a hole of v; it is one. Kept for learning only. */
  int time(int v, int value) {
    return bitsAt[v] >= 0
        ? removedAt[(bitsAt[v] << 6) + value - base[v]]
        : sparseTime[find(v, value)];
  }

  /** Least value of v that is at least {@code value} and no hole; there is one. */
  int next(int v, int value) {
    if (bitsAt[v] < 0) {
      int next = value;
      while (find(v, next) >= 0) {
        next++;
      }
      return next;
    }
    int bit = value - base[v];
    int word = bitsAt[v] + (bit >>> 6);
    long rest = bits[word] & (-1L << bit);
    while (rest == 0) {
      rest = bits[++word];
    }
    return base[v] + ((word - bitsAt[v]) << 6) + Long.numberOfTrailingZeros(rest);
  }

  /** Greatest value of v that is at most {@code value} and no hole; there is one. */
  int previous(int v, int value) {
    if (bitsAt[v] < 0) {
      int previous = value;
      while (find(v, previous) >= 0) {
        previous--;
      }
      return previous;
    }
    int bit = value - base[v];
    int word = bitsAt[v] + (bit >>> 6);
    long rest = bits[word] & -1L >>> (63 - (bit & 63));
    while (rest == 0) {
      rest = bits[--word];
    }
    return base[v] + ((word - bitsAt[v]) << 6) + 63 - Long.numberOfLeadingZeros(rest);
  }

  /** Number of values of v in {@code min..max}; holes of wide domains are counted as values. */
  int size(int v, int min, int max) {
    if (bitsAt[v] < 0 || count[v] == 0) {
      return max - min + 1;
    }
    int from = min - base[v];
    int to = max - base[v];
    int first = bitsAt[v] + (from >>> 6);
    int last = bitsAt[v] + (to >>> 6);
    long low = -1L << from;
    long high = -1L >>> (63 - (to & 63));
    if (first == last) {
      return Long.bitCount(bits[first] & low & high);
    }
    int size = Long.bitCount(bits[first] & low) + Long.bitCount(bits[last] & high);
    for (int w = first + 1; w < last; w++) {
      size += Long.bitCount(bits[w]);
    }
    return size;
  }

  private void makeBits(int v) {
    int need = (width[v] + 63) >>> 6;
    if (words + need > bits.length) {
      bits = Arrays.copyOf(bits, Math.max(words + need, 2 * bits.length));
    }
    if (learning && removedAt.length < bits.length << 6) {
      removedAt = Arrays.copyOf(removedAt, bits.length << 6);
    }
    Arrays.fill(bits, words, words + need, -1L);
    bitsAt[v] = words;
    words += need;
  }

  private void addSparse(int v, int value, int time) {
    if (sparseCount == sparse.length) {
      growSparse();
    }
    long key = key(v, value);
    sparse[sparseCount] = key;
    sparseTime[sparseCount] = time;
    chain[sparseCount] = head[bucket(key)];
    head[bucket(key)] = sparseCount++;
  }

  private void growSparse() {
    int room = 2 * sparseCount;
    sparse = Arrays.copyOf(sparse, room);
    sparseTime = Arrays.copyOf(sparseTime, room);
    chain = new int[room];
    head = new int[room];
    Arrays.fill(head, NONE);
    for (int i = 0; i < sparseCount; i++) {
      int bucket = bucket(sparse[i]);
      chain[i] = head[bucket];
      head[bucket] = i;
    }
  }

  private int find(int v, int value) {
    long key = key(v, value);
    int i = head[bucket(key)];
    while (i >= 0 && sparse[i] != key) {
      i = chain[i];
    }
    return i;
  }

  /** Fibonacci hashing, Knuth (1998), The Art of Computer Programming 3, section 6.4. */
  private int bucket(long key) {
    return (int) ((key * 0x9E37_79B9_7F4A_7C15L) >>> (Long.numberOfLeadingZeros(head.length) + 1));
  }

  private static long key(int v, int value) {
    return (long) v << 32 | (value & 0xFFFF_FFFFL);
  }
}
