package steelyard.adapters.sat.encoding;

import java.util.List;
import java.util.function.IntConsumer;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.View;

/** Domains that only shrink: between two bounds, which always are values. */
final class Bounds {
  private final Domain[] domains;
  private final int[] low;
  private final int[] high;
  private final IntConsumer changed;
  private boolean failed;

  /**
   * The given domains, by variable.
   *
   * @param changed told each variable of which a bound has moved
   */
  Bounds(List<Domain> domains, IntConsumer changed) {
    this.domains = domains.toArray(Domain[]::new);
    this.low = domains.stream().mapToInt(Domain::min).toArray();
    this.high = domains.stream().mapToInt(Domain::max).toArray();
    this.changed = changed;
  }

  /** Whether a domain has become empty; the bounds mean nothing then. */
  boolean hasFailed() {
    return failed;
  }

  void fail() {
    failed = true;
  }

  int low(int variable) {
    return low[variable];
  }

  int high(int variable) {
    return high[variable];
  }

  long min(View view) {
    return switch (view.sign()) {
      case 1 -> low[view.variable()] + (long) view.offset();
      case -1 -> view.offset() - (long) high[view.variable()];
      default -> view.offset();
    };
  }

  long max(View view) {
    return -min(view.negated());
  }

  void raise(int variable, long value) {
    if (value > low[variable] && value <= high[variable]) {
      low[variable] = ceiling(domains[variable], (int) value);
      moved(variable);
    } else if (value > high[variable]) {
      fail();
    }
  }

  void lower(int variable, long value) {
    if (value < high[variable] && value >= low[variable]) {
      high[variable] = floor(domains[variable], (int) value);
      moved(variable);
    } else if (value < low[variable]) {
      fail();
    }
  }

  void raise(View view, long value) {
    if (view.isConstant()) {
      failed |= view.offset() < value;
    } else if (view.sign() > 0) {
      raise(view.variable(), value - view.offset());
    } else {
      lower(view.variable(), view.offset() - value);
    }
  }

  void lower(View view, long value) {
    raise(view.negated(), -value);
  }

  /** Only the given values of {@code view} are left. */
  void keep(View view, IntStream values) {
    if (view.isConstant()) {
      failed |= values.noneMatch(value -> value == view.offset());
      return;
    }
    int x = view.variable();
    int[] kept =
        values
            .map(value -> view.sign() * (value - view.offset()))
            .filter(value -> value >= low[x] && value <= high[x] && domains[x].contains(value))
            .toArray();
    if (kept.length == 0) {
      fail();
      return;
    }
    domains[x] = Domain.of(kept);
    raise(x, domains[x].min());
    lower(x, domains[x].max());
  }

  private void moved(int variable) {
    failed |= low[variable] > high[variable];
    changed.accept(variable);
  }

  private static int ceiling(Domain domain, int value) {
    int range = 0;
    while (value > domain.to(range)) {
      range++;
    }
    return Math.max(value, domain.from(range));
  }

  private static int floor(Domain domain, int value) {
    int range = domain.ranges() - 1;
    while (value < domain.from(range)) {
      range--;
    }
    return Math.min(value, domain.to(range));
  }

  /** The values that are left, by variable. */
  List<Domain> domains() {
    return IntStream.range(0, domains.length).mapToObj(this::domain).toList();
  }

  private Domain domain(int variable) {
    Domain domain = domains[variable];
    int from = low[variable];
    int to = high[variable];
    if (from == domain.min() && to == domain.max()) {
      return domain;
    }
    return Domain.ofRanges(
        IntStream.range(0, domain.ranges())
            .filter(r -> domain.to(r) >= from && domain.from(r) <= to)
            .flatMap(r -> IntStream.of(Math.max(from, domain.from(r)), Math.min(to, domain.to(r))))
            .toArray());
  }
}
