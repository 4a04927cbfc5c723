package steelyard.variants.catalog.glazing;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Lexicographic;
import steelyard.variants.model.Lexicographic.Ties;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/**
 * Every rule and every cost is the same for an order of tiles and for that order from its end to
 * its beginning. Of the two, the one that is not the later in the order of rows is kept.
 */
final class MirrorOrder implements Amendment<GlazeLine> {
  static final String NAME = "mirror-order";

  @Override
  public String name() {
    return NAME;
  }

  @Override
  public String summary() {
    return "of an order of tiles and the same from the end, only one is tried";
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  @Override
  public Role role(GlazeLine line) {
    return new Role.Symmetry(line.slots() < 2 ? List.of() : List.of(reversal(line.slots())));
  }

  @Override
  public void apply(GlazeLine line, Change change) {
    int last = line.slots() - 1;
    Slots slots = new Slots(line, change::variable);
    List<IntVar> front = half(line).mapToObj(slots::kind).toList();
    List<IntVar> back = half(line).mapToObj(slot -> slots.kind(last - slot)).toList();
    if (!front.isEmpty()) {
      change
          .group("not later than from the end")
          .post(new Lexicographic(Views.of(front), Views.of(back), Ties.ALLOWED));
    }
  }

  /** The slots before the middle. */
  private static IntStream half(GlazeLine line) {
    return IntStream.range(0, line.slots() / 2);
  }

  private static Permutation reversal(int slots) {
    Map<String, String> images = new TreeMap<>();
    for (int slot = 0; slot < slots; slot++) {
      images.put(Names.kind(slot), Names.kind(slots - 1 - slot));
    }
    return Permutation.of(images);
  }
}
