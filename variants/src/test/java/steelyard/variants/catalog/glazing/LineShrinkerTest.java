package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import steelyard.variants.model.Ints;

class LineShrinkerTest {
  private static int size(GlazeLine line) {
    return line.slots()
        + line.kinds().size()
        + line.treatments().size()
        + (line.hasGlazes() ? 1 : 0);
  }

  @Test
  void each_step_is_smaller() {
    for (GlazeLine line : LongStream.range(0, 60).mapToObj(RandomLine::of).toList()) {
      assertThat(LineShrinker.of(line).toList())
          .as("%s", line)
          .allMatch(smaller -> size(smaller) < size(line));
    }
  }

  @Test
  void treatments_that_are_left_are_counted_anew() {
    GlazeLine line =
        new GlazeLine(
            List.of(new Treatment(1, 2, 0), new Treatment(2, 3, 5)),
            List.of(new Kind(1, Ints.of(0, 1), 0)),
            0,
            1);
    assertThat(LineShrinker.of(line))
        .contains(
            new GlazeLine(
                List.of(new Treatment(2, 3, 5)), List.of(new Kind(1, Ints.of(0), 0)), 0, 1));
  }

  @Test
  void nothing_is_left_out_of_one_tile_with_one_treatment() {
    GlazeLine line =
        new GlazeLine(List.of(new Treatment(1, 2, 0)), List.of(new Kind(1, Ints.of(0), 0)), 0, 1);
    assertThat(LineShrinker.of(line)).isEmpty();
  }
}
