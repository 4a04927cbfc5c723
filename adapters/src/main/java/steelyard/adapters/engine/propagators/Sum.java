package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * A linear sum {@code Σ a[i]·h[i] + constant} in normal form: coefficients positive, each variable
 * once, in the order of first mention.
 */
public final class Sum {
  /** Greatest magnitude that a sum, all its parts and its bound may reach. */
  public static final long LIMIT = (1L << 62) - 1;

  private final long[] coefficient;
  private final int[] handle;
  private final long constant;

  private Sum(long[] coefficient, int[] handle, long constant) {
    this.coefficient = coefficient;
    this.handle = handle;
    this.constant = constant;
  }

  /**
   * The sum of {@code a[i]} times row i.
   *
   * @throws IllegalArgumentException if Σ |a[i]·row| can pass 2^62 - 1 within the domains of {@code
   *     s}
   */
  public static Sum of(Store s, long[] a, Scope x) {
    if (a.length != x.size()) {
      throw new IllegalArgumentException(a.length + " coefficients for " + x.size() + " terms");
    }
    check(s, a, x);
    long constant = 0;
    for (int i = 0; i < a.length; i++) {
      constant += a[i] * x.offset(i);
    }
    long[] net = new long[a.length];
    int[] first = firstMentions(x);
    for (int i = 0; i < a.length; i++) {
      net[first[i]] += (x.handle(i) & 1) == 0 ? a[i] : -a[i];
    }
    return normal(net, x, constant);
  }

  /** For each row, the first row of the same variable. */
  private static int[] firstMentions(Scope x) {
    long[] rows = new long[x.size()];
    for (int i = 0; i < rows.length; i++) {
      rows[i] = (long) (x.handle(i) >> 1) << 32 | i;
    }
    Arrays.sort(rows);
    int[] first = new int[rows.length];
    for (int k = 0; k < rows.length; k++) {
      boolean again = k > 0 && rows[k] >>> 32 == rows[k - 1] >>> 32;
      first[(int) rows[k]] = again ? first[(int) rows[k - 1]] : (int) rows[k];
    }
    return first;
  }

  private static void check(Store s, long[] a, Scope x) {
    try {
      long reach = 0;
      for (int i = 0; i < a.length; i++) {
        int h = x.handle(i);
        long values = Math.max(Math.abs((long) s.min(h)), Math.abs((long) s.max(h)));
        long reachOfTerm = values + Math.abs((long) x.offset(i));
        reach = Math.addExact(reach, Math.multiplyExact(Math.absExact(a[i]), reachOfTerm));
      }
      if (reach > LIMIT) {
        throw new ArithmeticException();
      }
    } catch (ArithmeticException e) {
      throw new IllegalArgumentException("a linear sum can pass 2^62 - 1", e);
    }
  }

  private static Sum normal(long[] net, Scope x, long constant) {
    int kept = 0;
    long[] coefficient = new long[net.length];
    int[] handle = new int[net.length];
    for (int i = 0; i < net.length; i++) {
      int variable = x.handle(i) >> 1;
      if (net[i] != 0 && variable != Store.ZERO) {
        coefficient[kept] = Math.abs(net[i]);
        handle[kept++] = 2 * variable + (net[i] < 0 ? 1 : 0);
      }
    }
    return new Sum(Arrays.copyOf(coefficient, kept), Arrays.copyOf(handle, kept), constant);
  }

  /** The sum of the rows. */
  public static Sum of(Store s, Scope x) {
    long[] ones = new long[x.size()];
    Arrays.fill(ones, 1);
    return of(s, ones, x);
  }

  /** The sum with all signs turned. */
  public Sum negated() {
    int[] mirrored = handle.clone();
    for (int i = 0; i < mirrored.length; i++) {
      mirrored[i] ^= 1;
    }
    return new Sum(coefficient, mirrored, -constant);
  }

  /** The sum without its constant, all coefficients divided by {@code divisor}. */
  Sum dividedBy(long divisor) {
    long[] divided = coefficient.clone();
    for (int i = 0; i < divided.length; i++) {
      divided[i] /= divisor;
    }
    return new Sum(divided, handle, 0);
  }

  /** Greatest common divisor of the coefficients; 0 if there are none. */
  long divisor() {
    long gcd = 0;
    for (long a : coefficient) {
      long rest = a;
      while (rest != 0) {
        long next = gcd % rest;
        gcd = rest;
        rest = next;
      }
    }
    return gcd;
  }

  /** Number of terms. */
  public int size() {
    return handle.length;
  }

  /** Coefficient of term i, positive. */
  public long coefficient(int i) {
    return coefficient[i];
  }

  /** Handle of term i. */
  public int handle(int i) {
    return handle[i];
  }

  /** The constant part. */
  public long constant() {
    return constant;
  }

  /** Least value within the domains, each variable on its own. */
  public long min(Store s) {
    long sum = constant;
    for (int i = 0; i < handle.length; i++) {
      sum += coefficient[i] * s.min(handle[i]);
    }
    return sum;
  }

  /** Greatest value within the domains, each variable on its own. */
  public long max(Store s) {
    long sum = constant;
    for (int i = 0; i < handle.length; i++) {
      sum += coefficient[i] * s.max(handle[i]);
    }
    return sum;
  }

  /** Whether all coefficients are 1. */
  boolean unit() {
    for (long a : coefficient) {
      if (a != 1) {
        return false;
      }
    }
    return true;
  }

  /** Least coefficient; {@link #LIMIT} if there is no term. */
  long leastCoefficient() {
    long least = LIMIT;
    for (long a : coefficient) {
      least = Math.min(least, a);
    }
    return least;
  }
}
