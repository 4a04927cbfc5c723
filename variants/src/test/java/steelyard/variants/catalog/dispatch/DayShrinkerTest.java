package steelyard.variants.catalog.dispatch;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;
import steelyard.variants.model.Ints;

class DayShrinkerTest {
  private static final Legs LEGS =
      new Legs(List.of(Ints.of(0, 2, 3), Ints.of(4, 0, 5), Ints.of(6, 7, 0)));
  private static final Order ONE = new Order(3, 1, 0, 9, 1, 20);
  private static final Order TWO = new Order(2, 1, 5, 6, 1, 20);
  private static final Truck TRUCK = new Truck(5, 1, 30, 4);

  @Test
  void leaves_out_an_order_with_its_ways_or_a_truck() {
    Legs first = new Legs(List.of(Ints.of(0, 2), Ints.of(4, 0)));
    Legs second = new Legs(List.of(Ints.of(0, 3), Ints.of(6, 0)));
    Truck other = new Truck(9, 1, 30, 4);
    assertThat(DayShrinker.of(new Dispatch(List.of(TRUCK, other), List.of(ONE, TWO), LEGS, LEGS)))
        .containsExactly(
            new Dispatch(List.of(TRUCK, other), List.of(TWO), second, second),
            new Dispatch(List.of(TRUCK, other), List.of(ONE), first, first),
            new Dispatch(List.of(other), List.of(ONE, TWO), LEGS, LEGS),
            new Dispatch(List.of(TRUCK), List.of(ONE, TWO), LEGS, LEGS));
  }

  @Test
  void leaves_nothing_out_of_one_order_for_one_truck() {
    Legs legs = new Legs(List.of(Ints.of(0, 2), Ints.of(4, 0)));
    assertThat(DayShrinker.of(new Dispatch(List.of(TRUCK), List.of(ONE), legs, legs))).isEmpty();
  }
}
