package steelyard.variants.catalog.workshop;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;

class WorkshopReaderTest {
  @TempDir private Path folder;

  @Test
  void reads_routes_between_comments_and_empty_lines() {
    Workshop workshop =
        Workshops.read(folder, "# made up", "", " 2 2 ", "0 3\t1  2", "# b", "1 4 1 0");
    assertThat(workshop.stations()).isEqualTo(2);
    assertThat(workshop.moulds())
        .containsExactly(
            new Mould(List.of(new Operation(0, 3), new Operation(1, 2))),
            new Mould(List.of(new Operation(1, 4), new Operation(1, 0))));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "''                    | text:1: no instance here",
        "# nothing             | text:1: no instance here",
        "2                     | text:1: the first line gives how many moulds and how many stations",
        "2 2 2                 | text:1: the first line gives how many moulds and how many stations",
        "0 2                   | each at least 1",
        "1 0                   | each at least 1",
        "1 1/0 x               | text:2: 'x' is not a whole number from 0 to 10^9",
        "1 1/0 -3              | text:2: '-3' is not a whole number from 0 to 10^9",
        "1 1/0 3.5             | text:2: '3.5' is not a whole number",
        "1 1/0 1000000001      | text:2: '1000000001' is not a whole number from 0 to 10^9",
        "1 1/0 99999999999999999999999 | '99999999999999999999...' is not a whole number",
        "1 1/#/1 3             | text:3: no station 1; the stations count from 0 to 0",
        "2 2/0 3 1 2           | text:2: the file ends after 1 of 2 moulds; add the missing lines",
        "1 2/0 3 1 2/1 1 0 1   | text:3: a line after the last of 1 moulds; remove it",
        "1 2/0 3 1             | text:2: 3 numbers for mould 0; a station and minutes for each of 2",
        "1 2/0 3               | operations make 4",
        "1 2/0 3 1 2 0         | text:2: 5 numbers for mould 0",
        "1 1000000000/0 3      | operations make 2000000000",
        "1 2/0 1000000000 1 1  | text: all minutes together are 1000000001, more than 10^9",
      })
  void names_the_line_and_what_to_do_whenGiven(String text, String message) {
    assertThatThrownBy(() -> Workshops.read(folder, text.split("/", -1)))
        .isInstanceOf(InstanceException.class)
        .hasMessageContaining(message)
        .hasMessageNotContaining("\n");
  }
}
