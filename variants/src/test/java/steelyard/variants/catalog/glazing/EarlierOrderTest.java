package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.model.Ints;

class EarlierOrderTest {
  private static GlazeLine line(Kind... kinds) {
    return new GlazeLine(List.of(new Treatment(1, 2, 0)), List.of(kinds), 1, 9);
  }

  @Test
  void keeps_the_order_of_the_tiles_that_are_ordered_again() {
    Kind stamped = new Kind(2, Ints.of(0), 0);
    Kind white = new Kind(2, Ints.of(), 0);
    Kind blue = new Kind(1, Ints.of(), 1);
    SortedMap<String, Integer> kinds = new TreeMap<>();
    List<Integer> order = List.of(0, 1, 0, 2, 1);
    for (int slot = 0; slot < order.size(); slot++) {
      kinds.put("kind[" + slot + "]", order.get(slot));
    }
    assertThat(
            EarlierOrder.hint(
                line(stamped, white, blue),
                new Answer(kinds, OptionalLong.empty()),
                line(blue, new Kind(3, Ints.of(0), 0), new Kind(1, Ints.of(0), 1))))
        .as("both stamped white tiles, then the blue one; no plain white ones are wanted")
        .containsEntry("kind[0]", 1)
        .containsEntry("kind[1]", 1)
        .containsEntry("kind[2]", 0)
        .hasSize(3);
  }
}
