package steelyard.harness.worker;

import java.util.Arrays;

/**
 * A fixed task, the same on every machine and JDK, that tells how fast the machine is now: integer
 * arithmetic with branches over an array that leaves the first cache, as solvers do.
 */
final class Calibration {
  private static final int WORDS = 1 << 18;
  private static final int ROUNDS = 40;
  private static final int REPEATS = 5;
  private static final long EXPECTED = checksum(0);

  private Calibration() {}

  /** Nanoseconds of the median repeat, the first being warm-up. */
  static long nanos() {
    long[] nanos = new long[REPEATS];
    for (int i = 0; i < REPEATS; i++) {
      long start = System.nanoTime();
      if (checksum(0) != EXPECTED) {
        throw new IllegalStateException("the machine does not compute alike twice");
      }
      nanos[i] = System.nanoTime() - start;
    }
    Arrays.sort(nanos);
    return nanos[REPEATS / 2];
  }

  private static long checksum(long seed) {
    int[] words = new int[WORDS];
    long state = seed + 0x9E3779B97F4A7C15L;
    for (int round = 0; round < ROUNDS; round++) {
      for (int i = 0; i < WORDS; i++) {
        // Marsaglia (2003), "Xorshift RNGs", Journal of Statistical Software 8(14).
        state ^= state << 13;
        state ^= state >>> 7;
        state ^= state << 17;
        int at = (int) (state & (WORDS - 1));
        words[at] += (state & 1) == 0 ? i : words[i] ^ (int) state;
      }
    }
    long sum = state;
    for (int word : words) {
      sum = 31 * sum + word;
    }
    return sum;
  }
}
