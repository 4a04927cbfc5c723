package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Ints;

/** Smaller days: each has fewer orders or fewer trucks than the one that it is made from. */
final class DayShrinker {
  private final Dispatch day;

  private DayShrinker(Dispatch day) {
    this.day = day;
  }

  /** The boldest step first. */
  static Stream<Dispatch> of(Dispatch day) {
    DayShrinker it = new DayShrinker(day);
    return Stream.concat(it.fewerOrders(), it.fewerTrucks());
  }

  /** Without half of the orders, a quarter of them and so on, down to one. */
  private Stream<Dispatch> fewerOrders() {
    int orders = day.orders().size();
    return IntStream.iterate(orders / 2, block -> block > 0, block -> block / 2)
        .boxed()
        .flatMap(
            block ->
                IntStream.iterate(1, from -> from <= orders, from -> from + block)
                    .mapToObj(from -> keeping(stop -> stop < from || stop >= from + block)));
  }

  private Dispatch keeping(IntPredicate stops) {
    int[] kept = IntStream.concat(IntStream.of(0), day.stops().filter(stops)).toArray();
    List<Order> orders = IntStream.of(kept).skip(1).mapToObj(day::order).toList();
    return new Dispatch(day.trucks(), orders, legs(day.times(), kept), legs(day.costs(), kept));
  }

  private static Legs legs(Legs legs, int[] kept) {
    return new Legs(
        IntStream.of(kept)
            .mapToObj(from -> Ints.of(IntStream.of(kept).map(to -> legs.get(from, to)).toArray()))
            .toList());
  }

  private Stream<Dispatch> fewerTrucks() {
    return day.truckNumbers()
        .filter(out -> day.trucks().size() > 1)
        .mapToObj(
            out -> {
              List<Truck> trucks = new ArrayList<>(day.trucks());
              trucks.remove(out);
              return new Dispatch(trucks, day.orders(), day.times(), day.costs());
            });
  }
}
