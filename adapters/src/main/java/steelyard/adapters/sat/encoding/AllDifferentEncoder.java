package steelyard.adapters.sat.encoding;

import java.util.stream.LongStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Views;

/**
 * No value is taken twice: at most one of the literals that say so, by value. Where there are as
 * many values as views, each is taken; where there are fewer, the pigeons have no room.
 */
final class AllDifferentEncoder {
  static final String NAME = "at most one per value";

  private final Cnf cnf;
  private final Integers integers;
  private final Cardinality cardinality;

  AllDifferentEncoder(Cnf cnf, Integers integers) {
    this.cnf = cnf;
    this.integers = integers;
    this.cardinality = new Cardinality(cnf);
  }

  void encode(AllDifferent relation) {
    Views scope = relation.scope();
    long[] takers = takers(scope);
    int values = 0;
    for (int from = 0; from < takers.length; from = end(takers, from)) {
      values++;
    }
    if (values < scope.size()) {
      cnf.end();
      return;
    }
    for (int from = 0; from < takers.length; from = end(takers, from)) {
      Literals taken = taken(scope, takers, from, end(takers, from));
      if (taken.size() > 1) {
        cardinality.atMost(taken, 1, Cnf.TRUE);
      }
      if (values == scope.size()) {
        cnf.orAny(taken).end();
      }
    }
  }

  /** For each value of each view, the value and the view's place, in ascending order. */
  private long[] takers(Views scope) {
    LongStream.Builder takers = LongStream.builder();
    for (int i = 0; i < scope.size(); i++) {
      long place = i;
      integers.forEachValue(scope.get(i), value -> takers.add(((long) value << 32) + place));
    }
    return takers.build().sorted().toArray();
  }

  /** Where the run of one value ends. */
  private static int end(long[] takers, int from) {
    int end = from;
    while (end < takers.length && takers[end] >> 32 == takers[from] >> 32) {
      end++;
    }
    return end;
  }

  private Literals taken(Views scope, long[] takers, int from, int to) {
    Literals taken = new Literals(to - from);
    for (int k = from; k < to; k++) {
      taken.add(integers.is(scope.get((int) takers[k]), takers[k] >> 32));
    }
    return taken;
  }
}
