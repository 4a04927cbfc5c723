package steelyard.variants.catalog.dispatch;

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

class DispatchReaderTest {
  private static final String SHORT = "dispatch 1 1/truck 5 1 20 9/order 2 1 0 8 1 30";

  @TempDir private Path folder;

  @Test
  void reads_trucks_orders_times_and_costs() {
    Dispatch day =
        Days.read(
            folder,
            "# made up",
            "dispatch 1 1",
            "truck 5 1 20 9",
            "",
            "order 2 3 4 8 1 30",
            "time 0 3",
            "time 2 0",
            "cost 0 11",
            "cost 12 0");
    assertThat(day)
        .isEqualTo(
            new Dispatch(
                List.of(new Truck(5, 1, 20, 9)),
                List.of(new Order(2, 3, 4, 8, 1, 30)),
                new Legs(List.of(Ints.of(0, 3), Ints.of(2, 0))),
                new Legs(List.of(Ints.of(0, 11), Ints.of(12, 0)))));
  }

  @Test
  void reads_what_is_written() {
    LongStream.range(0, 50)
        .mapToObj(seed -> RandomDay.of(seed, 4, 3))
        .forEach(
            day -> assertThat(Days.read(folder, DispatchText.of(day, "a day"))).isEqualTo(day));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "''                          | text:1: no instance here; here should stand 'dispatch'",
        "truck 1 1 1 1               | text:1: 'truck' where 'dispatch' should stand: how many",
        "dispatch 1                  | text:1: 1 number where 2 should stand: trucks and orders",
        "dispatch 0 1                | text:1: from 1 to 1000 trucks and as many orders",
        "dispatch 1 1001             | text:1: from 1 to 1000 trucks and as many orders",
        "dispatch 1 1                | text:1: the file ends too soon; here should stand 'truck'",
        "dispatch 1 1/order 1        | text:2: 'order' where 'truck' should stand: truck 0",
        "dispatch 1 1/truck 1 1 1    | text:2: 3 numbers where 4 should stand: pallets, size",
        "dispatch 1 1/truck 1 1 1 x  | text:2: 'x' is not a whole number from 0 to 10^9",
        "dispatch 1 1/truck 1 1 1 1000001 | text:2: 1000001 is more than 1000000",
        "dispatch 1 1/truck 1 1 1 1/order 0 1 0 1 1 1 | text:3: an order of no pallets",
        "dispatch 1 1/truck 1 1 1 1/order 1 1 5 4 1 1 | text:3: closes at 4 before it opens at 5",
      })
  void names_the_line_and_what_to_do_whenGiven(String text, String message) {
    assertRefused(text, message);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "time 0 1                         | text:4: the file ends too soon; here should stand 'time'",
        "time 0 1 2                       | text:4: 3 numbers where 2 should stand: one for each",
        "time 1 1                         | text:4: from stop 0 to itself is 0, not 1",
        "time 0 1/cost 1 0                | text:5: 'cost' where 'time' should stand: times from",
        "time 0 1/time 1 0/cost 0 1       | text:6: the file ends too soon; here should stand 'cost'",
        "time 0 1/time 1 0/cost 0 1/cost 1 0/cost 1 0 | text:8: a line after the last costs",
      })
  void names_the_line_of_a_leg_whenGiven(String text, String message) {
    assertRefused(SHORT + "/" + text, message);
  }

  private void assertRefused(String text, String message) {
    assertThatThrownBy(() -> Days.read(folder, text.split("/", -1)))
        .isInstanceOf(InstanceException.class)
        .hasMessageContaining(message)
        .hasMessageNotContaining("\n");
  }
}
