package steelyard.adapters.engine.search;

import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Store;

/** Which half of a domain is tried first. */
public enum ValueOrder {
  /** The least value, then all others. */
  MIN {
    @Override
    long decide(Store s, int h) {
      return Atom.le(h, s.min(h));
    }
  },
  /** The greatest value, then all others. */
  MAX {
    @Override
    long decide(Store s, int h) {
      return Atom.ge(h, s.max(h));
    }
  },
  /** The median value, the lower of two, then all others; of wide domains the middle. */
  MEDIAN {
    @Override
    long decide(Store s, int h) {
      int value = s.min(h);
      if (!s.mayHaveHoles(h) || s.max(h) - value > COUNTED) {
        value = s.next(h, middle(s, h));
      } else {
        for (int below = (s.size(h) - 1) / 2; below > 0 && value < s.max(h); below--) {
          value = s.next(h, value + 1);
        }
      }
      return Atom.eq(h, value);
    }
  },
  /** The lower half of the range, then the upper. */
  LOWER_HALF {
    @Override
    long decide(Store s, int h) {
      return Atom.le(h, middle(s, h));
    }
  },
  /** The upper half of the range, then the lower. */
  UPPER_HALF {
    @Override
    long decide(Store s, int h) {
      return Atom.ge(h, middle(s, h) + 1);
    }
  };

  /** Values up to which a median is counted out. */
  private static final int COUNTED = 4096;

  /** The atom to try for h, which is open. */
  abstract long decide(Store s, int h);

  private static int middle(Store s, int h) {
    return Math.floorDiv(s.min(h) + s.max(h), 2);
  }
}
