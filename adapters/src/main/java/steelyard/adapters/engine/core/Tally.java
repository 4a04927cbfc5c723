package steelyard.adapters.engine.core;

import java.util.Arrays;

/** How often constraints propagated and failed, in total and by the tag they were posted with. */
final class Tally {
  long total;
  private long[] propagations = new long[16];
  private long[] failures = new long[16];
  private int tags;

  /** Makes room for a tag, which must not be negative. */
  void tag(int tag) {
    if (tag < 0) {
      throw new IllegalArgumentException("tag " + tag + " is negative");
    }
    tags = Math.max(tags, tag + 1);
    if (tags > propagations.length) {
      int room = Math.max(tags, 2 * propagations.length);
      propagations = Arrays.copyOf(propagations, room);
      failures = Arrays.copyOf(failures, room);
    }
  }

  void propagated(int tag) {
    total++;
    propagations[tag]++;
  }

  void failed(int tag) {
    failures[tag]++;
  }

  long[] propagations() {
    return Arrays.copyOf(propagations, tags);
  }

  long[] failures() {
    return Arrays.copyOf(failures, tags);
  }
}
