package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalLong;
import org.junit.jupiter.api.Test;
import steelyard.variants.family.Answer;
import steelyard.variants.model.Ints;

class EarlierToursTest {
  private static final Order BIG = new Order(4, 1, 0, 9, 1, 20);
  private static final Order SMALL = new Order(1, 1, 0, 9, 1, 20);
  private static final Order LATE = new Order(2, 1, 8, 9, 1, 20);
  private static final Truck VAN = new Truck(5, 1, 30, 4);
  private static final Truck LORRY = new Truck(9, 1, 30, 8);

  private static Dispatch day(List<Truck> trucks, Order... orders) {
    int stops = orders.length + 1;
    int[][] rows = new int[stops][stops];
    for (int from = 0; from < stops; from++) {
      for (int to = 0; to < stops; to++) {
        rows[from][to] = from == to ? 0 : 1;
      }
    }
    Legs legs = new Legs(Arrays.stream(rows).map(Ints::of).toList());
    return new Dispatch(trucks, List.of(orders), legs, legs);
  }

  @Test
  void keeps_the_stops_that_are_there_again_with_the_trucks_that_are() {
    Dispatch before = day(List.of(VAN, LORRY), BIG, SMALL, LATE);
    Plan plan = new Plan(List.of(List.of(2), List.of(1, 3)));
    Dispatch now = day(List.of(LORRY, VAN), LATE, SMALL);
    assertThat(
            EarlierTours.hint(
                before, new Answer(plan.decisions(before), OptionalLong.empty()), now))
        .isEqualTo(new Plan(List.of(List.of(1), List.of(2))).decisions(now));
  }

  @Test
  void leaves_a_truck_at_the_works_that_is_another_one_now() {
    Dispatch before = day(List.of(VAN), BIG);
    Dispatch now = day(List.of(LORRY), BIG);
    Plan plan = new Plan(List.of(List.of(1)));
    assertThat(
            EarlierTours.hint(
                before, new Answer(plan.decisions(before), OptionalLong.empty()), now))
        .isEqualTo(Plan.idle(now).decisions(now));
  }
}
