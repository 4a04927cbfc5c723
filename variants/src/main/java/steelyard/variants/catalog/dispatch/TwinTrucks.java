package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Trucks that are alike can change tours in any plan. No two tours have the same first stop, so
 * that exactly one way to give tours to like trucks has the first stops falling; a truck that stays
 * at the works is last.
 */
final class TwinTrucks implements Amendment<Dispatch> {
  static final String NAME = "twin-trucks";

  @Override
  public String name() {
    return NAME;
  }

  @Override
  public String summary() {
    return "trucks that are alike go out in the order of the numbers of their first stops";
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  @Override
  public Role role(Dispatch day) {
    return new Role.Symmetry(twins(day).stream().map(twins -> exchange(twins, day)).toList());
  }

  @Override
  public void apply(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group group = change.group("like trucks by their first stops");
    for (Twins twins : twins(day)) {
      group.post(tours.next(twins.one, 0).ge(tours.next(twins.other, 0)));
    }
  }

  /** Two trucks that are alike, next to each other among all that are. */
  private record Twins(int one, int other) {}

  private static List<Twins> twins(Dispatch day) {
    List<Twins> twins = new ArrayList<>();
    Map<Truck, Integer> latest = new HashMap<>();
    for (int truck = 0; truck < day.trucks().size(); truck++) {
      Integer before = latest.put(day.truck(truck), truck);
      if (before != null) {
        twins.add(new Twins(before, truck));
      }
    }
    return twins;
  }

  private static Permutation exchange(Twins twins, Dispatch day) {
    Map<String, String> images = new TreeMap<>();
    for (int stop = 0; stop <= day.orders().size(); stop++) {
      String one = Names.next(twins.one, stop);
      String other = Names.next(twins.other, stop);
      images.put(one, other);
      images.put(other, one);
    }
    return Permutation.of(images);
  }
}
