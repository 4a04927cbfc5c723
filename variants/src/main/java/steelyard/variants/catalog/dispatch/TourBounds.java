package steelyard.variants.catalog.dispatch;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Bounds on what tours take, bring and cost. */
final class TourBounds {
  private TourBounds() {}

  /** Driving and unloading alone fit into the shift; waiting only adds to them. */
  static void shiftBudget(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    Group group = change.group("a tour within the shift");
    day.truckNumbers()
        .forEach(
            truck -> {
              List<Term> parts = new ArrayList<>();
              IntStream.rangeClosed(0, day.orders().size())
                  .forEach(s -> parts.add(Term.at(day.times().from(s), tours.next(truck, s))));
              day.stops().forEach(s -> parts.add(tours.calls(truck, s).times(day.unloading(s))));
              group.post(Term.sum(parts).le(day.truck(truck).shift()));
            });
  }

  /** The trucks that go out take together what is delivered. */
  static void enoughTrucks(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    List<Term> room = new ArrayList<>();
    List<Term> delivered = new ArrayList<>();
    day.truckNumbers().forEach(t -> room.add(tours.calls(t, 0).times(day.truck(t).pallets())));
    day.stops().forEach(s -> delivered.add(tours.calling(s).times(day.order(s).pallets())));
    change.group("room for what is delivered").post(Term.sum(room).ge(Term.sum(delivered)));
  }

  /**
   * Into each stop with a truck, and back to the works with each truck that goes out, leads a way
   * no cheaper than the cheapest.
   */
  static void cheapestWaysIn(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    List<Term> least = new ArrayList<>();
    int home = day.costs().smallestInto(0);
    day.truckNumbers().forEach(truck -> least.add(tours.calls(truck, 0).times(home)));
    day.stops()
        .forEach(stop -> least.add(tours.calling(stop).times(day.costs().smallestInto(stop))));
    change.group("no cheaper ways in than there are").post(tours.driving().ge(Term.sum(least)));
  }

  /** No dearer than the plan that is made order by order, where there is one. */
  static void greedyCost(Dispatch day, Change change) {
    Tours tours = new Tours(day, change::variable);
    GreedyPlan.of(day)
        .ifPresent(
            plan ->
                change
                    .group("no dearer than the greedy plan")
                    .post(tours.driving().plus(tours.sending()).le(plan.cost(day))));
  }
}
