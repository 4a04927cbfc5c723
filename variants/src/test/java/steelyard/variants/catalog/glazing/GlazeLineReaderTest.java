package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.util.List;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;
import steelyard.variants.model.Ints;

class GlazeLineReaderTest {
  @TempDir private Path folder;

  private GlazeLine read(String... lines) {
    return Lines.read(folder, lines);
  }

  @Test
  void reads_treatments_and_kinds_between_comments_and_empty_lines() {
    GlazeLine line = read("# made up", "", "3 2 2", " 1\t2", "2 3", "# b", "0 1 0 1", "1 2 1 0 ");
    assertThat(line)
        .isEqualTo(
            new GlazeLine(
                List.of(new Treatment(1, 2, 0), new Treatment(2, 3, 0)),
                List.of(new Kind(1, Ints.of(1), 0), new Kind(2, Ints.of(0), 0)),
                0,
                3));
    assertThat(line.hasCost()).isFalse();
    assertThat(line.hasGlazes()).isFalse();
  }

  @Test
  void reads_glazes_costs_and_runs_in_any_order() {
    GlazeLine line =
        read("3 1 2", "1", "2", "0 1 0", "1 2 1", "run 2", "excess 7", "glaze 4 9", "change 5");
    assertThat(line)
        .isEqualTo(
            new GlazeLine(
                List.of(new Treatment(1, 2, 7)),
                List.of(new Kind(1, Ints.of(), 4), new Kind(2, Ints.of(0), 9)),
                5,
                2));
    assertThat(line.hasCost()).isTrue();
  }

  @Test
  void reads_what_is_written() {
    LongStream.range(0, 50)
        .mapToObj(seed -> LineGenerator.of(LineRecipe.mixed(12), seed))
        .forEach(line -> assertThat(read(LineText.of(line, "a line"))).isEqualTo(line));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "''                    | text:1: no instance here; here should stand how many tiles",
        "# nothing             | text:1: no instance here",
        "3 1                   | text:1: 2 numbers where 3 should stand: tiles, treatments and kinds",
        "0 1 1                 | text:1: at least one tile, one treatment and one kind are needed",
        "1 0 1                 | text:1: at least one tile, one treatment",
        "1 1 0                 | text:1: at least one tile, one treatment",
        "x 1 1                 | text:1: 'x' is not a whole number from 0 to 10^9",
        "1 -1 1                | text:1: '-1' is not a whole number",
        "1 1 1000000001        | text:1: '1000000001' is not a whole number from 0 to 10^9",
        "1 1 999999999999999999999 | '99999999999999999999...' is not a whole number",
        "1 1 1                 | text:1: the file ends too soon; here should stand the most tiles",
        "1 1 1/1 1             | text:2: 2 numbers where 1 should stand: the most tiles of each",
        "1 1 1/1               | text:2: the file ends too soon; here should stand the length",
        "1 1 1/0/2             | text:3: treatment 0 for at most 0 of 2 tiles; at least 1",
        "1 1 1/3/2             | text:3: treatment 0 for at most 3 of 2 tiles",
        "1 1 1/1/2             | text:3: the file ends too soon; here should stand kind 0 of 1",
        "1 1 1/1/2/1 1 0       | text:4: kind 1 where kind 0 comes next",
        "1 1 1/1/2/0 1         | text:4: 2 numbers where 3 should stand: number, tiles and a 0 or 1",
        "1 1 1/1/2/0 1 2       | text:4: a kind needs a treatment or not: 1 or 0 for each",
        "2 1 1/1/2/0 1 0       | text:1: 2 tiles, but the kinds add up to 1; correct one of them",
        "1 1 1/1/2/0 1 0/1 1 0 | text:5: '1' after the last of 1 kinds; here may stand glaze, change",
        "1 1 1/1/2/0 1 0/glaze | text:5: 0 numbers where 1 should stand: the glaze of each kind",
        "1 1 1/1/2/0 1 0/run 0 | text:5: a run of one glaze has at least 1 tile",
        "1 1 1/1/2/0 1 0/run 1/run 1 | text:6: a second line 'run'; one is enough",
        "1 1 1/1/2/0 1 0/excess 1 1  | text:5: 2 numbers where 1 should stand: a price for each",
        "1 1 1/1/2/0 1 0/change | text:5: 0 numbers where 1 should stand: what a change costs",
        "1 1 1/1/2/0 1 0/change x | text:5: 'x' is not a whole number",
      })
  void names_the_line_and_what_to_do_whenGiven(String text, String message) {
    assertThatThrownBy(() -> read(text.split("/", -1)))
        .isInstanceOf(InstanceException.class)
        .hasMessageContaining(message)
        .hasMessageNotContaining("\n");
  }
}
