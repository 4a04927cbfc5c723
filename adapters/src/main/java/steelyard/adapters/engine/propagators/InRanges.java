package steelyard.adapters.engine.propagators;

import steelyard.adapters.engine.core.Propagator;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Wiring;

/**
 * {@code h} lies in one of several ascending ranges: a domain whose gaps are too wide to be kept
 * value by value.
 *
 * <p>Strength: bounds(D); a value within a gap goes when a bound reaches it. Cost: log of the
 * number of ranges. Not explained yet.
 */
public final class InRanges implements Propagator {
  private final int h;
  private final int[] from;
  private final int[] to;

  /** The ranges {@code from[r]..to[r]}, ascending, with gaps between them. */
  public InRanges(int h, int[] from, int[] to) {
    this.h = h;
    this.from = from.clone();
    this.to = to.clone();
  }

  @Override
  public int cost() {
    return CONSTANT;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onBounds(h);
  }

  @Override
  public boolean propagate(Store s) {
    int low = range(s.min(h));
    if (low == from.length) {
      return s.fail(0);
    }
    int high = range(s.max(h));
    boolean within = high < from.length && from[high] <= s.max(h);
    if (!within && high == 0) {
      return s.fail(0);
    }
    return s.setMin(h, from[low], 0) && (within || s.setMax(h, to[high - 1], 0));
  }

  /** The first range that does not end before {@code value}. */
  private int range(int value) {
    int low = 0;
    int high = from.length;
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (to[middle] < value) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }
}
