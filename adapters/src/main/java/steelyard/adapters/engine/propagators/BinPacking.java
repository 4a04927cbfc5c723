package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import java.util.stream.LongStream;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * Item i lies in bin {@code bins[i]}, counted from 0, and the load of each bin is the sum of its
 * items' sizes.
 *
 * <p>Rules: a load lies between what is packed and what may still be; all loads together are the
 * sum of all sizes; an item leaves a bin that would be too full with it, and takes one that would
 * be too empty without it. Strength: weaker than bounds(Z), which is NP-hard. Cost: items times
 * bins. Not explained yet. Forms: posted and conditional.
 *
 * <p>Source: Shaw (2004), A constraint for bin packing, CP, LNCS 3258:648-662, section 2.
 */
public final class BinPacking implements Decidable {
  /** What no load reaches: larger sizes are cut to it, which changes nothing. */
  private static final long TOO_LARGE = Store.LIMIT + 1L;

  private final Scope bins;
  private final long[] sizes;
  private final Scope loads;
  private final long total;
  private final long[] packed;
  private final long[] possible;

  /** {@code sizes[i] ≥ 0} is the size of item i. */
  public BinPacking(Scope bins, long[] sizes, Scope loads) {
    if (bins.size() != sizes.length) {
      throw new IllegalArgumentException(bins.size() + " items with " + sizes.length + " sizes");
    }
    this.bins = bins;
    this.loads = loads;
    this.sizes = LongStream.of(sizes).map(size -> Math.min(size, TOO_LARGE)).toArray();
    total = LongStream.of(this.sizes).sum();
    packed = new long[loads.size()];
    possible = new long[loads.size()];
  }

  @Override
  public int cost() {
    return LOGLINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAny(bins);
    wiring.onBounds(loads);
  }

  @Override
  public boolean propagate(Store s) {
    for (int i = 0; i < sizes.length; i++) {
      if (!bins.setMin(s, i, 0, 0) || !bins.setMax(s, i, loads.size() - 1, 0)) {
        return false;
      }
    }
    weigh(s);
    if (!boundByItems(s) || !boundByTotal(s)) {
      return false;
    }
    for (int i = 0; i < sizes.length; i++) {
      if (sizes[i] > 0 && !bins.fixed(s, i) && !place(s, i)) {
        return false;
      }
    }
    return true;
  }

  /** Sums what is in each bin and what may be. */
  private void weigh(Store s) {
    Arrays.fill(packed, 0);
    Arrays.fill(possible, 0);
    for (int i = 0; i < sizes.length; i++) {
      if (bins.fixed(s, i)) {
        int b = bins.min(s, i);
        if (b >= 0 && b < packed.length) {
          packed[b] += sizes[i];
          possible[b] += sizes[i];
        }
      } else {
        int last = Math.min(bins.max(s, i), possible.length - 1);
        for (int b = Math.max(bins.min(s, i), 0); b <= last; b++) {
          possible[b] += bins.has(s, i, b) ? sizes[i] : 0;
        }
      }
    }
  }

  private boolean boundByItems(Store s) {
    for (int b = 0; b < packed.length; b++) {
      if (!loads.setMin(s, b, clamp(packed[b]), 0) || !loads.setMax(s, b, clamp(possible[b]), 0)) {
        return false;
      }
    }
    return true;
  }

  private boolean boundByTotal(Store s) {
    long least = 0;
    long greatest = 0;
    for (int b = 0; b < packed.length; b++) {
      least += loads.min(s, b);
      greatest += loads.max(s, b);
    }
    for (int b = 0; b < packed.length; b++) {
      long most = total - (least - loads.min(s, b));
      long fewest = total - (greatest - loads.max(s, b));
      if (!loads.setMax(s, b, clamp(most), 0) || !loads.setMin(s, b, clamp(fewest), 0)) {
        return false;
      }
    }
    return packed.length > 0 || total == 0 || s.fail(0);
  }

  private boolean place(Store s, int i) {
    int last = bins.max(s, i);
    for (int b = bins.min(s, i); b <= last; b++) {
      if (!bins.has(s, i, b)) {
        continue;
      }
      if (packed[b] + sizes[i] > loads.max(s, b)) {
        if (!bins.remove(s, i, b, 0)) {
          return false;
        }
      } else if (possible[b] - sizes[i] < loads.min(s, b)) {
        return bins.assign(s, i, b, 0);
      }
    }
    return true;
  }

  private static int clamp(long load) {
    return (int) Math.max(-Store.LIMIT - 1L, Math.min(Store.LIMIT + 1L, load));
  }

  @Override
  public Verdict verdict(Store s) {
    boolean fixed = true;
    for (int i = 0; i < sizes.length; i++) {
      if (bins.max(s, i) < 0 || bins.min(s, i) >= packed.length) {
        return Verdict.FALSE;
      }
      fixed &= bins.fixed(s, i);
    }
    weigh(s);
    for (int b = 0; b < packed.length; b++) {
      if (packed[b] > loads.max(s, b) || possible[b] < loads.min(s, b)) {
        return Verdict.FALSE;
      }
      fixed &= loads.fixed(s, b);
    }
    return fixed ? Verdict.TRUE : Verdict.OPEN;
  }
}
