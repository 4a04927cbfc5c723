package steelyard.variants.catalog.dispatch;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Branching.ValueOrder;
import steelyard.variants.model.Branching.VariableOrder;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/** Branchings and a hint; they change no solutions. */
final class SearchOrders {
  private SearchOrders() {}

  /** Where the trucks go, the stop with fewest ways left first; then the earliest times. */
  static void waysFirst(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    change.branch(ways(day, tours), VariableOrder.SMALLEST_DOMAIN, ValueOrder.MIN);
    times(day, change, tours);
  }

  /** The same where most conflicts were. */
  static void busiestWaysFirst(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    change.branch(ways(day, tours), VariableOrder.WEIGHTED_DEGREE, ValueOrder.MIN);
    times(day, change, tours);
  }

  /** Who delivers what, the dearest orders first; then where the trucks go; then when. */
  static void ordersFirst(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    List<IntVar> calls =
        day.dearestFirst().stream()
            .flatMap(stop -> day.truckNumbers().mapToObj(truck -> tours.calls(truck, stop)))
            .toList();
    change.branch(Views.of(calls), VariableOrder.INPUT, ValueOrder.MAX);
    change.branch(ways(day, tours), VariableOrder.SMALLEST_DOMAIN, ValueOrder.MIN);
    times(day, change, tours);
  }

  static void greedyHint(Dispatch day, Change change) {
    GreedyPlan.of(day)
        .ifPresent(
            plan ->
                plan.decisions(day)
                    .forEach((name, value) -> change.hint(change.variable(name), value)));
  }

  private static Views ways(Dispatch day, Tours tours) {
    return Views.of(
        day.truckNumbers()
            .boxed()
            .flatMap(
                truck ->
                    IntStream.rangeClosed(0, day.orders().size())
                        .mapToObj(stop -> tours.next(truck, stop)))
            .toList());
  }

  private static void times(Dispatch day, Change change, Tours tours) {
    Views begins = Views.of(day.stops().mapToObj(tours::begin).toList());
    change.branch(begins, VariableOrder.SMALLEST_MIN, ValueOrder.MIN);
  }
}
