package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import java.util.SortedMap;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.Answer;

class LineSheetTest {
  @TempDir private Path folder;

  private static Answer greedy(GlazeLine line) {
    SortedMap<String, Integer> values = new TreeMap<>();
    List<Integer> kinds = GreedyLine.of(line);
    for (int slot = 0; slot < kinds.size(); slot++) {
      values.put(Names.kind(slot), kinds.get(slot));
    }
    return new Answer(values, OptionalLong.empty());
  }

  @Test
  void shows_the_order_and_who_is_needed_when() {
    GlazeLine line =
        Lines.read(
            folder, "5 2 2", "1 1", "2 3", "0 3 0 0", "1 2 1 1", "glaze 0 1", "change 2", "run 2");
    assertThat(LineSheet.of(line, greedy(line)))
        .isEqualTo(
            """
            5 tiles of 2 kinds with 2 treatments, cost 6
            3 changes of glaze

            Kinds of tiles in the order in which they pass; the first slot is 0.
                     0  1 0 0 1 0

            Who is needed when: # for a tile with the treatment, . for one without,
            at most so many of so many in a row.

            from slot 0
                0  1/2      #..#.
                1  1/3      #..#.

            This plan says only in which order. Machine-safety rules, rules for glazes and
            dust, rest-time rules and local codes come first, and licensed practice decides
            what may run.
            """);
  }

  @ParameterizedTest
  @ValueSource(strings = {"4_72", "90-04", "changes-30-1"})
  void stays_within_80_columns_whenGiven(String instance) {
    GlazeLine line = Lines.shipped(instance);
    String sheet = LineSheet.of(line, greedy(line));
    assertThat(sheet.lines()).allMatch(text -> text.length() <= 80);
    assertThat(sheet).contains("from slot " + (line.slots() - 1) / 50 * 50);
  }
}
