package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Moulds with the same route can change places in any plan. Their first operations that take time
 * are at the same station, one after the other, so that exactly one order of the twins has them
 * ascending.
 */
final class TwinOrder implements Amendment<Workshop> {
  static final String NAME = "twin-order";

  @Override
  public String name() {
    return NAME;
  }

  @Override
  public String summary() {
    return "moulds with the same route start in the order of their numbers";
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  @Override
  public Role role(Workshop workshop) {
    return new Role.Symmetry(
        twins(workshop).stream()
            .map(twin -> exchange(twin, workshop.mould(twin.one).lastStep()))
            .toList());
  }

  @Override
  public void apply(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    Group group = change.group("twins in the order of their numbers");
    for (Twins twins : twins(workshop)) {
      int step = firstTimed(workshop.mould(twins.one));
      group.post(starts.of(twins.one, step).le(starts.of(twins.other, step)));
    }
  }

  /** Two moulds of the same route, next to each other among all of that route. */
  private record Twins(int one, int other) {}

  private static List<Twins> twins(Workshop workshop) {
    List<Twins> twins = new ArrayList<>();
    Map<Mould, Integer> latest = new LinkedHashMap<>();
    for (int m = 0; m < workshop.moulds().size(); m++) {
      Integer before = latest.put(workshop.mould(m), m);
      if (before != null) {
        twins.add(new Twins(before, m));
      }
    }
    return twins;
  }

  private static Permutation exchange(Twins twins, int lastStep) {
    Map<String, String> images = new TreeMap<>();
    for (int step = 0; step <= lastStep; step++) {
      String one = Names.start(twins.one, step);
      String other = Names.start(twins.other, step);
      images.put(one, other);
      images.put(other, one);
    }
    return Permutation.of(images);
  }

  private static int firstTimed(Mould mould) {
    int step = 0;
    while (step < mould.lastStep() && mould.minutes(step) == 0) {
      step++;
    }
    return step;
  }
}
