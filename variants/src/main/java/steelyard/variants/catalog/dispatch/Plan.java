package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.family.Answer;

/**
 * Where each truck goes.
 *
 * @param tours for each truck the stops in order, the works left out
 */
record Plan(List<List<Integer>> tours) {
  Plan {
    tours = tours.stream().map(List::copyOf).toList();
  }

  /** No truck goes anywhere. */
  static Plan idle(Dispatch day) {
    return new Plan(day.trucks().stream().map(truck -> List.<Integer>of()).toList());
  }

  /** Where the truck goes by an answer that was checked. */
  static List<Integer> tour(Dispatch day, int truck, Answer answer) {
    List<Integer> tour = new ArrayList<>();
    int stop = answer.value(Names.next(truck, 0));
    while (stop != 0 && tour.size() < day.orders().size()) {
      tour.add(stop);
      stop = answer.value(Names.next(truck, stop));
    }
    return tour;
  }

  List<Integer> tour(int truck) {
    return tours.get(truck);
  }

  /** The plan with another tour of one truck. */
  Plan with(int truck, List<Integer> tour) {
    List<List<Integer>> changed = new ArrayList<>(tours);
    changed.set(truck, tour);
    return new Plan(changed);
  }

  boolean delivers(int stop) {
    return tours.stream().anyMatch(tour -> tour.contains(stop));
  }

  /** What it costs, the carriers included. */
  long cost(Dispatch day) {
    long cost = day.stops().filter(s -> !delivers(s)).mapToLong(s -> day.order(s).carrier()).sum();
    for (int truck = 0; truck < tours.size(); truck++) {
      cost += cost(day, truck, tours.get(truck));
    }
    return cost;
  }

  /** What a tour of the truck costs. */
  static long cost(Dispatch day, int truck, List<Integer> tour) {
    long cost = tour.isEmpty() ? 0 : day.truck(truck).cost();
    int at = 0;
    for (int stop : tour) {
      cost += day.costs().get(at, stop);
      at = stop;
    }
    return cost + day.costs().get(at, 0);
  }

  /** When unloading begins at each stop of the tour; empty if the truck cannot drive it. */
  static Optional<List<Integer>> begins(Dispatch day, int truck, List<Integer> tour) {
    List<Integer> begins = new ArrayList<>();
    int at = 0;
    int now = 0;
    int load = 0;
    for (int stop : tour) {
      now = Math.max(day.order(stop).opens(), now + day.between(at, stop));
      load += day.order(stop).pallets();
      if (!day.fits(truck, stop) || now > day.order(stop).closes()) {
        return Optional.empty();
      }
      begins.add(now);
      at = stop;
    }
    Truck with = day.truck(truck);
    boolean isHome = tour.isEmpty() || now + day.between(at, 0) <= with.shift();
    return isHome && load <= with.pallets() ? Optional.of(begins) : Optional.empty();
  }

  /** The decisions of the plain model; every tour can be driven. */
  SortedMap<String, Integer> decisions(Dispatch day) {
    SortedMap<String, Integer> values = new TreeMap<>();
    day.stops().forEach(stop -> values.put(Names.begin(stop), day.order(stop).opens()));
    for (int truck = 0; truck < tours.size(); truck++) {
      for (int stop = 0; stop <= day.orders().size(); stop++) {
        values.put(Names.next(truck, stop), stop);
      }
      List<Integer> tour = tours.get(truck);
      List<Integer> begins = begins(day, truck, tour).orElseThrow();
      int at = 0;
      for (int i = 0; i < tour.size(); i++) {
        values.put(Names.next(truck, at), tour.get(i));
        values.put(Names.begin(tour.get(i)), begins.get(i));
        at = tour.get(i);
      }
      values.put(Names.next(truck, at), 0);
    }
    return values;
  }
}
