package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.Views;

/** The variables of a day's tours, and what is said with them. */
final class Tours {
  private final Dispatch day;
  private final Function<String, IntVar> byName;

  Tours(Dispatch day, Function<String, IntVar> byName) {
    this.day = day;
    this.byName = byName;
  }

  IntVar next(int truck, int stop) {
    return byName.apply(Names.next(truck, stop));
  }

  IntVar begin(int stop) {
    return byName.apply(Names.begin(stop));
  }

  IntVar calls(int truck, int stop) {
    return byName.apply(Names.calls(truck, stop));
  }

  /** Whether no truck calls at the stop; of orders that a carrier can take. */
  IntVar left(int stop) {
    return byName.apply(Names.left(stop));
  }

  /** Where the truck goes from each stop, from the works on. */
  Views nexts(int truck) {
    return Views.of(allStops().mapToObj(stop -> next(truck, stop)).toList());
  }

  Formula goes(int truck, int from, int to) {
    return Formula.literal(next(truck, from).view().is(to));
  }

  Formula isThere(int truck, int stop) {
    return Formula.literal(calls(truck, stop).view().atLeast(1));
  }

  /** How many trucks call at the stop: 0 or 1. */
  Term calling(int stop) {
    return Term.sum(day.truckNumbers().mapToObj(truck -> calls(truck, stop)).toList());
  }

  /** The pallets on the truck. */
  Term load(int truck) {
    List<IntVar> calls = day.stops().mapToObj(stop -> calls(truck, stop)).toList();
    return Term.scalar(calls, day.orders().stream().mapToLong(Order::pallets).toArray());
  }

  /** What driving costs. */
  Term driving() {
    List<IntVar> legs = new ArrayList<>();
    day.truckNumbers()
        .forEach(truck -> allStops().forEach(i -> legs.add(byName.apply(Names.cost(truck, i)))));
    return Term.sum(legs);
  }

  /** What trucks and carriers cost beside driving. */
  Term sending() {
    List<Term> costs = new ArrayList<>();
    day.truckNumbers().forEach(t -> costs.add(calls(t, 0).times(day.truck(t).cost())));
    day.stops()
        .filter(stop -> !day.order(stop).isOurs())
        .forEach(stop -> costs.add(left(stop).times(day.order(stop).carrier())));
    return Term.sum(costs);
  }

  /** The stops and the works. */
  private IntStream allStops() {
    return IntStream.rangeClosed(0, day.orders().size());
  }
}
