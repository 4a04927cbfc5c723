package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

class GlazeLineCheckerTest {
  /**
   * The example of CSPLib problem 1 (https://www.csplib.org/Problems/prob001, after Dincbas,
   * Simonis &amp; Van Hentenryck 1988): ten cars of six classes with five options. From memory.
   */
  private static final String[] EXAMPLE = {
    "10 5 6",
    "1 2 1 2 1",
    "2 3 3 5 5",
    "0 1 1 0 1 1 0",
    "1 1 0 0 0 1 0",
    "2 2 0 1 0 0 1",
    "3 2 0 1 0 1 0",
    "4 2 1 0 1 0 0",
    "5 2 1 1 0 0 0"
  };

  @TempDir private Path folder;

  private static Answer answer(int... kinds) {
    SortedMap<String, Integer> values = new TreeMap<>();
    for (int slot = 0; slot < kinds.length; slot++) {
      values.put("kind[" + slot + "]", kinds[slot]);
    }
    return new Answer(values, OptionalLong.of(99));
  }

  private static Check right(OptionalLong objective) {
    return new Check(List.of(), objective);
  }

  private GlazeLine example() {
    return Lines.read(folder, EXAMPLE);
  }

  /** The sequence printed beside it; from memory too. */
  @Test
  void finds_nothing_whenGiven_the_solution_of_the_published_example() {
    assertThat(GlazeLineChecker.check(example(), answer(0, 1, 5, 2, 4, 3, 3, 4, 2, 5)))
        .isEqualTo(right(OptionalLong.empty()));
  }

  @Test
  void names_the_window_whenGiven_too_many_in_it() {
    assertThat(GlazeLineChecker.check(example(), answer(0, 1, 5, 2, 4, 4, 3, 3, 2, 5)).problems())
        .containsExactly(
            "2 tiles with treatment 0 in slots 4-5; at most 1 may be",
            "3 tiles with treatment 1 in slots 6-8; at most 2 may be",
            "3 tiles with treatment 1 in slots 7-9; at most 2 may be",
            "2 tiles with treatment 2 in slots 3-5; at most 1 may be",
            "2 tiles with treatment 2 in slots 4-6; at most 1 may be");
  }

  @Test
  void names_the_kinds_whenGiven_other_numbers_than_ordered() {
    assertThat(GlazeLineChecker.check(example(), answer(1, 1, 5, 2, 4, 3, 3, 4, 2, 5)).problems())
        .contains("of kind 0 come 0 tiles; 1 are ordered", "of kind 1 come 2 tiles; 1 are ordered");
  }

  @Test
  void names_the_slots_whenGiven_half_an_order_or_kinds_that_are_none() {
    GlazeLine line = Lines.read(folder, "2 1 1", "1", "1", "0 2 0");
    assertThat(GlazeLineChecker.check(line, answer(0)))
        .isEqualTo(
            new Check(
                List.of("the plan does not say which kind of tile comes in slot 1"),
                OptionalLong.empty()));
    assertThat(GlazeLineChecker.check(line, answer(1, -1)).problems())
        .containsExactly("slot 0 has kind 1, which is none", "slot 1 has kind -1, which is none");
  }

  @Test
  void counts_what_is_to_pay_whatever_the_answer_says() {
    GlazeLine line =
        Lines.read(
            folder, "5 1 2", "1", "3", "0 2 0", "1 3 1", "glaze 0 1", "change 10", "excess 3");
    assertThat(GlazeLineChecker.check(line, answer(1, 0, 1, 1, 0)))
        .as("windows 1 0 1, 0 1 1 and 1 1 0, changes after slots 0, 1 and 3")
        .isEqualTo(right(OptionalLong.of(3 * 3 + 3 * 10)));
    assertThat(GlazeLineChecker.check(line, answer(1, 0, 0, 1, 1)))
        .isEqualTo(right(OptionalLong.of(3 + 2 * 10)));
  }

  @Test
  void names_the_tile_that_makes_a_run_too_long() {
    GlazeLine line = Lines.read(folder, "5 1 2", "1", "1", "0 4 0", "1 1 0", "glaze 3 1", "run 2");
    assertThat(GlazeLineChecker.check(line, answer(0, 0, 1, 0, 0)))
        .isEqualTo(right(OptionalLong.empty()));
    assertThat(GlazeLineChecker.check(line, answer(0, 1, 0, 0, 0)).problems())
        .containsExactly("slot 4 is tile 3 in a row of glaze 3; at most 2 may be");
  }

  @Test
  void takes_all_tiles_for_one_window_whenGiven_a_longer_window() {
    GlazeLine line = Lines.read(folder, "2 1 1", "1", "5", "0 2 1");
    assertThat(GlazeLineChecker.check(line, answer(0, 0)).problems())
        .containsExactly("2 tiles with treatment 0 in slots 0-1; at most 1 may be");
  }
}
