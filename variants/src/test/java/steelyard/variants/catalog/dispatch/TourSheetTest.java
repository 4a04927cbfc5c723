package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalLong;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import steelyard.variants.family.Answer;
import steelyard.variants.model.Ints;

class TourSheetTest {
  @Test
  void shows_tours_stop_by_stop_and_the_carriers() {
    Legs legs =
        new Legs(
            List.of(
                Ints.of(0, 3, 4, 5),
                Ints.of(3, 0, 2, 2),
                Ints.of(4, 2, 0, 2),
                Ints.of(5, 2, 2, 0)));
    Dispatch day =
        new Dispatch(
            List.of(new Truck(9, 1, 40, 50), new Truck(9, 1, 40, 50)),
            List.of(
                new Order(4, 2, 0, 9, 1, 50),
                new Order(3, 1, 7, 9, 2, 60),
                new Order(2, 2, 0, 8, 1, 20)),
            legs,
            legs);
    Plan plan = new Plan(List.of(List.of(1, 2), List.of()));
    assertThat(TourSheet.of(day, new Answer(plan.decisions(day), OptionalLong.empty())))
        .isEqualTo(
            """
            3 orders for 2 trucks, cost 79
            Times are hours and minutes since the shift began.

            truck 0 with 7 of 9 pallets, cost 59
              stop    arrives  unloads from         to   pallets  yard open
                 1       0:45          0:45       1:00         4  0:00 to 2:15
                 2       1:30          1:45       2:15         3  1:45 to 2:15
              back at 3:15, shift until 10:00

            truck 1 stays at the works

            By hired carrier, for 20:
              3

            This plan says only who goes where and when. Drivers' hours and breaks, load and
            axle limits, load securing and local traffic rules come first, and licensed
            practice decides who may drive what.
            """);
  }

  @ParameterizedTest
  @ValueSource(strings = {"tiny-3-1", "windows-12-1"})
  void stays_within_80_columns_whenGiven(String instance) {
    Dispatch day = Days.shipped(instance);
    Plan plan = GreedyPlan.of(day).orElseThrow();
    String sheet = TourSheet.of(day, new Answer(plan.decisions(day), OptionalLong.empty()));
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
  }

  @Test
  void stays_within_80_columns_whenGiven_many_orders_for_the_carrier_and_large_numbers() {
    Order order = new Order(1_000_000, 1_000_000, 0, 1_000_000, 1_000_000, 1_000_000);
    Truck truck = new Truck(1_000_000, 1, 1_000_000, 1_000_000);
    Legs legs =
        new Legs(
            IntStream.range(0, 61)
                .mapToObj(
                    from -> Ints.of(IntStream.range(0, 61).map(to -> from == to ? 0 : 1).toArray()))
                .toList());
    Dispatch day =
        new Dispatch(
            List.of(truck), IntStream.range(0, 60).mapToObj(i -> order).toList(), legs, legs);
    String sheet =
        TourSheet.of(day, new Answer(Plan.idle(day).decisions(day), OptionalLong.empty()));
    assertThat(sheet.lines()).allMatch(line -> line.length() <= 80);
    assertThat(sheet).contains("By hired carrier, for 60000000:").contains("59, 60");
  }
}
