package steelyard.adapters.spi;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Predicate;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Ints;

/** Every assignment of a few small domains. */
public final class AllAssignments {
  private AllAssignments() {}

  /** In lexicographic order. */
  public static List<Ints> of(List<Domain> domains) {
    List<Ints> all = new ArrayList<>();
    extend(domains, new int[domains.size()], 0, all);
    return all;
  }

  /** Those that pass. */
  public static List<Ints> of(List<Domain> domains, Predicate<int[]> passes) {
    return of(domains).stream().filter(values -> passes.test(values.toArray())).toList();
  }

  private static void extend(List<Domain> domains, int[] values, int at, List<Ints> all) {
    if (at == values.length) {
      all.add(Ints.of(values));
      return;
    }
    domains.get(at).stream()
        .forEach(
            x -> {
              values[at] = x;
              extend(domains, values, at + 1, all);
            });
  }
}
