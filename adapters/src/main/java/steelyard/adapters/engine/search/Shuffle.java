package steelyard.adapters.engine.search;

/**
 * Permutations by seed, the same everywhere: Fisher and Yates with the generator SplitMix64 of
 * Steele, Lea and Flood (2014), Fast splittable pseudorandom number generators, OOPSLA.
 */
final class Shuffle {
  private long state;

  private Shuffle(long seed) {
    state = seed;
  }

  /** A permutation of 0..n-1; seed 0 gives the identity. */
  static int[] permutation(int n, long seed) {
    int[] p = new int[n];
    for (int i = 0; i < n; i++) {
      p[i] = i;
    }
    if (seed != 0) {
      Shuffle random = new Shuffle(seed);
      for (int i = n - 1; i > 0; i--) {
        int j = (int) Long.remainderUnsigned(random.next(), i + 1);
        int kept = p[i];
        p[i] = p[j];
        p[j] = kept;
      }
    }
    return p;
  }

  private long next() {
    state += 0x9E37_79B9_7F4A_7C15L;
    long z = (state ^ (state >>> 30)) * 0xBF58_476D_1CE4_E5B9L;
    z = (z ^ (z >>> 27)) * 0x94D0_49BB_1331_11EBL;
    return z ^ (z >>> 31);
  }
}
