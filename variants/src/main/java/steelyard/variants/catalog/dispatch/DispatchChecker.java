package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalLong;
import steelyard.variants.family.Answer;
import steelyard.variants.family.Check;

/**
 * Checks a plan by driving it: reads where trucks go next and when unloading begins, and nothing
 * else of the answer.
 */
final class DispatchChecker {
  private final Dispatch day;
  private final Answer answer;
  private final List<String> problems = new ArrayList<>();
  private final int[] visits;
  private long cost;

  private DispatchChecker(Dispatch day, Answer answer) {
    this.day = day;
    this.answer = answer;
    this.visits = new int[day.orders().size() + 1];
  }

  static Check check(Dispatch day, Answer answer) {
    DispatchChecker checker = new DispatchChecker(day, answer);
    if (!checker.isComplete()) {
      return new Check(checker.problems, OptionalLong.empty());
    }
    for (int truck = 0; truck < day.trucks().size(); truck++) {
      checker.drive(truck);
    }
    for (int stop = 1; stop < checker.visits.length; stop++) {
      checker.deliver(stop);
    }
    return new Check(checker.problems, OptionalLong.of(checker.cost));
  }

  private boolean isComplete() {
    int last = day.orders().size();
    for (int truck = 0; truck < day.trucks().size(); truck++) {
      for (int stop = 0; stop <= last; stop++) {
        requireWithin(Names.next(truck, stop), 0, last);
      }
    }
    for (int stop = 1; stop <= last; stop++) {
      requireWithin(Names.begin(stop), 0, Dispatch.LARGEST);
    }
    return problems.isEmpty();
  }

  private void requireWithin(String name, int least, int most) {
    Integer value = answer.values().get(name);
    if (value == null) {
      problems.add("the plan does not say " + name);
    } else if (value < least || value > most) {
      problems.add(name + " is " + value + ", not from " + least + " to " + most);
    }
  }

  /** Follows the truck from the works until it is back, or has been everywhere. */
  private void drive(int truck) {
    List<Integer> tour = new ArrayList<>();
    int stop = next(truck, 0);
    while (stop != 0 && !tour.contains(stop)) {
      tour.add(stop);
      stop = next(truck, stop);
    }
    if (stop != 0) {
      problems.add("truck " + truck + " comes to stop " + stop + " again and never back");
      return;
    }
    requireNoOtherWays(truck, tour);
    if (!tour.isEmpty()) {
      cost += day.trucks().get(truck).cost();
      follow(truck, tour);
    }
  }

  private void requireNoOtherWays(int truck, List<Integer> tour) {
    for (int stop = 1; stop < visits.length; stop++) {
      if (!tour.contains(stop) && next(truck, stop) != stop) {
        problems.add(
            "truck " + truck + " goes on from stop " + stop + ", where its tour does not come");
      }
    }
  }

  private void follow(int truck, List<Integer> tour) {
    Truck with = day.trucks().get(truck);
    int load = 0;
    int at = 0;
    long ready = 0;
    for (int stop : tour) {
      Order order = day.orders().get(stop - 1);
      visits[stop]++;
      load += order.pallets();
      cost += day.costs().get(at, stop);
      arrive(truck, stop, ready + day.times().get(at, stop));
      if (with.size() > order.gate()) {
        problems.add("truck " + truck + " does not get through the gate of stop " + stop);
      }
      ready = (long) begin(stop) + order.unloading();
      at = stop;
    }
    cost += day.costs().get(at, 0);
    long back = ready + day.times().get(at, 0);
    if (back > with.shift()) {
      problems.add(
          "truck "
              + truck
              + " is back at "
              + back
              + ", after its shift, which ends at "
              + with.shift());
    }
    if (load > with.pallets()) {
      problems.add("truck " + truck + " has " + load + " pallets; it takes " + with.pallets());
    }
  }

  private void arrive(int truck, int stop, long arrival) {
    if (begin(stop) < arrival) {
      problems.add(
          "truck "
              + truck
              + " comes to stop "
              + stop
              + " at "
              + arrival
              + ", after unloading is to begin at "
              + begin(stop));
    }
  }

  private void deliver(int stop) {
    Order order = day.orders().get(stop - 1);
    if (begin(stop) < order.opens() || begin(stop) > order.closes()) {
      problems.add(
          "unloading at stop "
              + stop
              + " is to begin at "
              + begin(stop)
              + "; it can from "
              + order.opens()
              + " to "
              + order.closes());
    }
    if (visits[stop] > 1) {
      problems.add(visits[stop] + " trucks come to stop " + stop);
    } else if (visits[stop] == 0) {
      goByCarrier(stop, order);
    }
  }

  private void goByCarrier(int stop, Order order) {
    cost += order.carrier();
    if (order.carrier() == 0) {
      problems.add("no truck comes to stop " + stop + ", and no carrier takes the order");
    } else if (begin(stop) != order.opens()) {
      problems.add(
          "no truck comes to stop "
              + stop
              + ": its time should be when it opens, "
              + order.opens()
              + ", not "
              + begin(stop));
    }
  }

  private int next(int truck, int stop) {
    return answer.value(Names.next(truck, stop));
  }

  private int begin(int stop) {
    return answer.value(Names.begin(stop));
  }
}
