package pallets;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;

/** Two pallets of one weight can change places in every answer: one order of them is enough. */
final class TwinsInOrder implements Amendment<Delivery> {
  @Override
  public String name() {
    return "twins-in-order";
  }

  @Override
  public String summary() {
    return "of two pallets of one weight the first goes on the truck of the lower number";
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  /** A symmetry break says which exchanges it breaks, so that they can be checked. */
  @Override
  public Role role(Delivery delivery) {
    return new Role.Symmetry(
        twins(delivery).stream()
            .map(t -> Permutation.swap(PalletFamily.truck(t[0]), PalletFamily.truck(t[1])))
            .toList());
  }

  @Override
  public void apply(Delivery delivery, Change change) {
    List<IntVar> truck = PalletFamily.trucks(delivery, change);
    twins(delivery)
        .forEach(t -> change.group("twins in order").post(truck.get(t[0]).le(truck.get(t[1]))));
  }

  private static List<int[]> twins(Delivery delivery) {
    List<int[]> twins = new ArrayList<>();
    Map<Integer, Integer> latest = new LinkedHashMap<>();
    for (int p = 0; p < delivery.pallets(); p++) {
      Integer before = latest.put(delivery.weights().get(p), p);
      if (before != null) {
        twins.add(new int[] {before, p});
      }
    }
    return twins;
  }
}
