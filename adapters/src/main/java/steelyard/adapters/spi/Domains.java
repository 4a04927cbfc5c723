package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.View;

/** Domains made of others, range by range. */
final class Domains {
  private Domains() {}

  /** The values of {@code view} where its variable has those of {@code domain}. */
  static Domain of(View view, Domain domain) {
    int n = domain.ranges();
    int[] bounds = new int[2 * n];
    for (int r = 0; r < n; r++) {
      boolean ascending = view.sign() > 0;
      int from = ascending ? r : n - 1 - r;
      bounds[2 * r] = view.apply(ascending ? domain.from(from) : domain.to(from));
      bounds[2 * r + 1] = view.apply(ascending ? domain.to(from) : domain.from(from));
    }
    return Domain.ofRanges(bounds);
  }

  static Domain with(int value, Domain domain) {
    if (domain.contains(value)) {
      return domain;
    }
    List<Integer> bounds = new ArrayList<>(bounds(domain));
    int below = (int) IntStream.range(0, domain.ranges()).filter(r -> domain.to(r) < value).count();
    bounds.addAll(2 * below, List.of(value, value));
    return ofRanges(bounds);
  }

  /** The domain has other values, too. */
  static Domain without(int value, Domain domain) {
    List<Integer> bounds = new ArrayList<>();
    for (int r = 0; r < domain.ranges(); r++) {
      if (domain.from(r) < value) {
        bounds.addAll(List.of(domain.from(r), Math.min(domain.to(r), value - 1)));
      }
      if (domain.to(r) > value) {
        bounds.addAll(List.of(Math.max(domain.from(r), value + 1), domain.to(r)));
      }
    }
    return ofRanges(bounds);
  }

  private static List<Integer> bounds(Domain domain) {
    return IntStream.range(0, domain.ranges())
        .flatMap(r -> IntStream.of(domain.from(r), domain.to(r)))
        .boxed()
        .toList();
  }

  private static Domain ofRanges(List<Integer> bounds) {
    return Domain.ofRanges(bounds.stream().mapToInt(Integer::intValue).toArray());
  }
}
