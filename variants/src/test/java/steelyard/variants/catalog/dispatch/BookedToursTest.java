package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import steelyard.variants.family.InstanceException;
import steelyard.variants.family.InstanceSource;
import steelyard.variants.family.KnownSolution;
import steelyard.variants.model.Ints;

class BookedToursTest {
  private static final Legs LEGS =
      new Legs(List.of(Ints.of(0, 2, 3), Ints.of(2, 0, 1), Ints.of(3, 1, 0)));

  private static final Dispatch DAY =
      new Dispatch(
          List.of(new Truck(5, 1, 30, 4), new Truck(3, 1, 30, 4)),
          List.of(new Order(3, 1, 0, 9, 1, 20), new Order(2, 1, 5, 6, 1, 20)),
          LEGS,
          LEGS);

  @TempDir private Path folder;

  private KnownSolution read(String text) throws IOException {
    Path file = Files.writeString(folder.resolve("booked"), text.replace('/', '\n'));
    return BookedTours.read(DAY, new InstanceSource("booked", file));
  }

  @Test
  void reads_what_is_written() throws IOException {
    Plan plan = new Plan(List.of(List.of(1, 2), List.of()));
    assertThat(BookedTours.text(DAY, plan)).isEqualTo("tour 0 1 2\ncost 10\n");
    assertThat(read(BookedTours.text(DAY, plan)))
        .isEqualTo(new KnownSolution(plan.decisions(DAY), OptionalLong.of(10)));
    assertThat(plan.decisions(DAY)).containsEntry("begin[1]", 2).containsEntry("begin[2]", 5);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "tour 0 1            | booked:1: the file ends too soon; here should stand 'tour' with a",
        "tour 0/cost 1       | booked:1: a truck from 0 to 1 and at least one stop are needed",
        "tour 2 1/cost 1     | booked:1: a truck from 0 to 1 and at least one stop are needed",
        "tour 0 3/cost 1     | booked:1: stop 3 is none, or is called at twice",
        "tour 0 1 1/cost 1   | booked:1: stop 1 is none, or is called at twice",
        "tour 0 1/tour 0 2   | booked:2: a second tour of truck 0; one is all it can make",
        "tour 1 1 2/cost 1   | booked:1: truck 1 cannot drive this tour in time with that load",
        "drive 0 1           | booked:1: a line begins with 'tour' or 'cost'",
        "cost 1/tour 0 1     | booked:2: a line after what the day cost; put it before",
      })
  void names_the_line_and_what_to_do_whenGiven(String text, String message) {
    assertThatThrownBy(() -> read(text))
        .isInstanceOf(InstanceException.class)
        .hasMessageContaining(message);
  }
}
