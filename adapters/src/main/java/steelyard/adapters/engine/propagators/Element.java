package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code array[index] = result}, counted from 0; the index is within the array.
 *
 * <p>Strength: domain on the index. On the result, and on the entry once the index is fixed, domain
 * where the result has at most {@value #NARROW} values from its least to its greatest at the root,
 * else bounds. Cost: linear in the array and the result's range as long as the last witnesses hold.
 * Not explained yet. Forms: posted and conditional.
 *
 * <p>Source: Van Hentenryck and Carillon (1988), Generality versus specificity: an experience with
 * AI and OR techniques, AAAI 660-664; witnesses kept from run to run as in Lecoutre and Hemery
 * (2007), A study of residual supports in arc consistency, IJCAI 125-130.
 */
public final class Element implements Decidable {
  private static final int NARROW = 4096;

  private final Scope x;
  private final int n;
  private final int index;
  private final int result;
  private final int[] common;
  private final int base;
  private final int[] indexFor;

  /** {@code index} and {@code result} are one row each. */
  public Element(Store s, Scope array, Scope index, Scope result) {
    if (index.size() != 1 || result.size() != 1) {
      throw new IllegalArgumentException("an element has one index and one result");
    }
    n = array.size();
    this.index = n;
    this.result = n + 1;
    x = array.and(index).and(result);
    common = new int[n];
    base = result.min(s, 0);
    boolean narrow = result.max(s, 0) - base < NARROW;
    indexFor = new int[narrow ? result.max(s, 0) - base + 1 : 0];
    Arrays.fill(common, base);
  }

  @Override
  public int cost() {
    return LOGLINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAny(x);
  }

  @Override
  public boolean propagate(Store s) {
    if (!x.setMin(s, index, 0, 0) || !x.setMax(s, index, n - 1, 0)) {
      return false;
    }
    int last = x.max(s, index);
    for (int i = x.min(s, index); i <= last; i++) {
      if (x.has(s, index, i) && !meets(s, i) && !x.remove(s, index, i, 0)) {
        return false;
      }
    }
    return boundResult(s)
        && (indexFor.length == 0 || supportResult(s))
        && (!x.fixed(s, index) || equate(s, x.min(s, index)));
  }

  /** Whether entry i and the result have a value in common. */
  private boolean meets(Store s, int i) {
    if (x.has(s, i, common[i]) && x.has(s, result, common[i])) {
      return true;
    }
    int most = Math.min(x.max(s, i), x.max(s, result));
    for (int v = Math.max(x.min(s, i), x.min(s, result)); v <= most; v++) {
      if (x.has(s, i, v) && x.has(s, result, v)) {
        common[i] = v;
        return true;
      }
    }
    return false;
  }

  private boolean boundResult(Store s) {
    int least = Integer.MAX_VALUE;
    int greatest = Integer.MIN_VALUE;
    int last = x.max(s, index);
    for (int i = x.min(s, index); i <= last; i++) {
      if (x.has(s, index, i)) {
        least = Math.min(least, x.min(s, i));
        greatest = Math.max(greatest, x.max(s, i));
      }
    }
    return x.setMin(s, result, least, 0) && x.setMax(s, result, greatest, 0);
  }

  private boolean supportResult(Store s) {
    int greatest = x.max(s, result);
    for (int v = x.min(s, result); v <= greatest; v++) {
      if (x.has(s, result, v) && !reached(s, v) && !x.remove(s, result, v, 0)) {
        return false;
      }
    }
    return true;
  }

  /** Whether some entry that the index can pick can be v. */
  private boolean reached(Store s, int v) {
    int kept = indexFor[v - base];
    if (x.has(s, index, kept) && x.has(s, kept, v)) {
      return true;
    }
    int last = x.max(s, index);
    for (int i = x.min(s, index); i <= last; i++) {
      if (x.has(s, index, i) && x.has(s, i, v)) {
        indexFor[v - base] = i;
        return true;
      }
    }
    return false;
  }

  private boolean equate(Store s, int i) {
    if (!x.setMin(s, i, x.min(s, result), 0) || !x.setMax(s, i, x.max(s, result), 0)) {
      return false;
    }
    if (indexFor.length == 0 || !s.mayHaveHoles(x.handle(result))) {
      return true;
    }
    int greatest = x.max(s, result);
    for (int v = x.min(s, result); v <= greatest; v++) {
      if (!x.has(s, result, v) && !x.remove(s, i, v, 0)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public Verdict verdict(Store s) {
    boolean possible = false;
    boolean certain = x.min(s, index) >= 0 && x.max(s, index) < n && x.fixed(s, result);
    int last = Math.min(x.max(s, index), n - 1);
    for (int i = Math.max(x.min(s, index), 0); i <= last; i++) {
      if (x.has(s, index, i)) {
        boolean meets = meets(s, i);
        possible |= meets;
        certain &= meets && x.fixed(s, i);
      }
    }
    return !possible ? Verdict.FALSE : certain ? Verdict.TRUE : Verdict.OPEN;
  }
}
