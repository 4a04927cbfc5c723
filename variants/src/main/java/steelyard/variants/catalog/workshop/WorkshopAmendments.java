package steelyard.variants.catalog.workshop;

import static steelyard.variants.family.Amendments.dominance;
import static steelyard.variants.family.Amendments.excluding;
import static steelyard.variants.family.Amendments.implied;
import static steelyard.variants.family.Amendments.reformulation;
import static steelyard.variants.family.Amendments.requiring;
import static steelyard.variants.family.Amendments.search;

import java.util.List;
import steelyard.variants.family.Amendment;

/** The workshop's amendments, in the order in which they apply. */
final class WorkshopAmendments {
  private static final String NO_OVERLAP = "no-overlap";
  private static final String CUMULATIVE = "cumulative";
  private static final String ORDERS = "orders";
  private static final String EARLIEST_FIRST = "earliest-first";

  private WorkshopAmendments() {}

  static List<Amendment<Workshop>> all() {
    return List.of(
        excluding(
            reformulation(
                NO_OVERLAP,
                "one no-overlap constraint for each station instead of the pairs",
                StationConstraints::noOverlap),
            CUMULATIVE),
        excluding(
            reformulation(
                CUMULATIVE,
                "a cumulative constraint of capacity 1 for each station instead of the pairs",
                StationConstraints::cumulative),
            NO_OVERLAP),
        implied(
            "load-bound",
            "no plan is shorter than a station's work with what must come before and after it",
            TimeBounds::loadBound),
        implied(
            "load-from-first",
            "from a station's first start on, all its work and the shortest tail are to come",
            TimeBounds::loadFromFirst),
        implied(
            "work-left",
            "from each operation's start on, all that is left of its mould is to come",
            TimeBounds::workLeft),
        implied(
            ORDERS,
            "a named yes or no for each pair at a station: does the first come before the other",
            Orders::named),
        requiring(
            implied(
                "transitive-orders",
                "what comes before a mould that comes before a third comes before the third",
                Orders::transitive),
            ORDERS),
        dominance(
            "left-shifted",
            "every operation starts when its mould arrives or its station becomes free",
            LeftShift::post),
        new TwinOrder(),
        search(
            EARLIEST_FIRST,
            "decide the operation that can start first, and start it then",
            SearchOrders::earliestFirst),
        excluding(
            requiring(
                search(
                    "order-first",
                    "decide which of two moulds comes first, where most conflicts were",
                    SearchOrders::orderFirst),
                ORDERS),
            EARLIEST_FIRST),
        search(
            "greedy-hint",
            "try the plan first that is made without looking ahead",
            SearchOrders::greedyHint));
  }
}
