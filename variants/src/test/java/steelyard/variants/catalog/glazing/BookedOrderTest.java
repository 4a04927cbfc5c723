package steelyard.variants.catalog.glazing;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;

class BookedOrderTest {
  @TempDir private Path folder;

  private KnownSolution read(String... lines) throws IOException {
    GlazeLine line = Lines.read(folder, "4 1 2", "1", "2", "0 2 0", "1 2 1");
    Path file = Files.write(folder.resolve("booked"), List.of(lines));
    return BookedOrder.read(line, new InstanceSource("booked", file));
  }

  @Test
  void reads_kinds_on_any_number_of_lines_and_the_cost() throws IOException {
    KnownSolution order = read("# monday", "1 0 1", "0", "cost 7");
    assertThat(order.decisions())
        .containsEntry("kind[0]", 1)
        .containsEntry("kind[1]", 0)
        .containsEntry("kind[2]", 1)
        .containsEntry("kind[3]", 0)
        .hasSize(4);
    assertThat(order.objective()).hasValue(7);
    assertThat(read("1 0 1 0").objective()).isEmpty();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "1 0 1             | booked:1: the file ends too soon; here should stand the kind of the tile",
        "1 0 2 0           | booked:1: no kind 2; the kinds count from 0 to 1",
        "1 0 1/0 0         | booked:2: more than 4 tiles; leave out the others",
        "1 0 1 0/1         | booked:2: after the last tile only 'cost' with a number may stand",
        "1 0 1 0/cost      | booked:2: 0 numbers where 1 should stand: what the order costs",
        "1 0 1 0/cost 1/2  | booked:2: after the last tile only 'cost'",
      })
  void names_the_line_and_what_to_do_whenGiven(String text, String message) {
    assertThatThrownBy(() -> read(text.split("/", -1)))
        .isInstanceOf(InstanceException.class)
        .hasMessageContaining(message);
  }
}
