package steelyard.variants.catalog.dispatch;

import static steelyard.variants.family.Amendments.dominance;
import static steelyard.variants.family.Amendments.excluding;
import static steelyard.variants.family.Amendments.implied;
import static steelyard.variants.family.Amendments.reformulation;
import static steelyard.variants.family.Amendments.search;

import java.util.List;
import java.util.stream.Stream;
import steelyard.variants.family.Amendment;

/** The dispatch yard's amendments, in the order in which they apply. */
final class DispatchAmendments {
  private static final String ELEMENT_TIMES = "element-times";
  private static final String LEG_TABLE = "leg-table";
  private static final String WAYS_FIRST = "ways-first";
  private static final String BUSIEST_WAYS = "busiest-ways-first";
  private static final String ORDERS_FIRST = "orders-first";

  private DispatchAmendments() {}

  static List<Amendment<Dispatch>> all() {
    return Stream.of(otherForms(), consequences(), preferences(), searches())
        .flatMap(List::stream)
        .toList();
  }

  private static List<Amendment<Dispatch>> otherForms() {
    return List.of(
        excluding(
            reformulation(
                ELEMENT_TIMES,
                "the time at the next stop is looked up instead of a case for each leg",
                TimeForms::byElement),
            LEG_TABLE),
        excluding(
            reformulation(
                LEG_TABLE,
                "the next stop, the time and the cost of the way there are a row of a table",
                TimeForms::byTable),
            ELEMENT_TIMES),
        reformulation(
            "tours-by-time",
            "no two stops before the same one; times rule out rounds without the works",
            TourForms::toursByTime),
        reformulation(
            "packed-loads",
            "each order is packed onto a truck or the carriers, instead of a sum for each truck",
            TourForms::packedLoads));
  }

  private static List<Amendment<Dispatch>> consequences() {
    return List.of(
        implied(
            "different-next",
            "no two stops of a truck have the same next stop",
            TourForms::differentNext),
        implied(
            "two-ways",
            "the stop before each stop, with what the ways into stops cost",
            TourForms::twoWays),
        implied(
            "impossible-ways",
            "ways that cannot be driven in time or with both loads are left out",
            ReachRules::impossibleWays),
        implied(
            "reachable-times",
            "unloading begins when the truck can be there, and can be back in time",
            ReachRules::reachableTimes),
        implied(
            "never-together",
            "two orders that cannot be on one tour in either order are not",
            ReachRules::neverTogether),
        implied(
            "shift-budget",
            "driving and unloading of a tour fit into the shift",
            TourBounds::shiftBudget),
        implied(
            "enough-trucks",
            "the trucks that go out take together what is delivered",
            TourBounds::enoughTrucks),
        implied(
            "cheapest-ways-in",
            "driving costs no less than the cheapest ways into the stops",
            TourBounds::cheapestWaysIn));
  }

  private static List<Amendment<Dispatch>> preferences() {
    return List.of(
        dominance(
            "no-waiting",
            "unloading begins as soon as the truck is there and the yard is open",
            Preferences::noWaiting),
        dominance(
            "twin-orders",
            "orders that are alike are delivered in the order of their numbers",
            Preferences::twinOrders),
        dominance(
            "worth-the-way",
            "no truck makes a detour that costs more than the carrier",
            Preferences::worthTheWay),
        dominance(
            "greedy-cost",
            "no dearer than the plan that is made order by order",
            TourBounds::greedyCost),
        new TwinTrucks());
  }

  private static List<Amendment<Dispatch>> searches() {
    return List.of(
        excluding(
            search(
                WAYS_FIRST,
                "decide where trucks go, where fewest ways are left, then the earliest times",
                SearchOrders::waysFirst),
            BUSIEST_WAYS,
            ORDERS_FIRST),
        excluding(
            search(
                BUSIEST_WAYS,
                "decide where trucks go, where most conflicts were, then the earliest times",
                SearchOrders::busiestWaysFirst),
            WAYS_FIRST,
            ORDERS_FIRST),
        excluding(
            search(
                ORDERS_FIRST,
                "decide who delivers what, the dearest orders first, then the ways",
                SearchOrders::ordersFirst),
            WAYS_FIRST,
            BUSIEST_WAYS),
        search(
            "greedy-hint",
            "try the plan first that is made order by order",
            SearchOrders::greedyHint));
  }
}
