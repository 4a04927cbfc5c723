package steelyard.variants.catalog.kilns;

import static steelyard.variants.family.Amendments.dominance;
import static steelyard.variants.family.Amendments.excluding;
import static steelyard.variants.family.Amendments.implied;
import static steelyard.variants.family.Amendments.reformulation;
import static steelyard.variants.family.Amendments.requiring;
import static steelyard.variants.family.Amendments.search;

import java.util.List;
import java.util.stream.Stream;
import steelyard.variants.family.Amendment;

/** The kilns' amendments, in the order in which they apply. */
final class KilnAmendments {
  private static final String NUMBERED = "numbered";
  private static final String CHANGE_TABLE = "change-table";
  private static final String CHANGE_ELEMENT = "change-element";
  private static final String URGENT_FIRST = "urgent-first";
  private static final String LARGEST_FIRST = "largest-first";
  private static final String HEATS_FIRST = "heats-first";

  private KilnAmendments() {}

  static List<Amendment<Campaign>> all() {
    return Stream.of(reformulations(), bounds(), symmetries(), dominances(), searches())
        .flatMap(List::stream)
        .toList();
  }

  private static List<Amendment<Campaign>> reformulations() {
    return List.of(
        reformulation(
            NUMBERED,
            "each lot has the number of its firing beside a yes or no for each",
            Numbered::firings),
        requiring(
            reformulation(
                "bin-packing",
                "one bin packing of lots into firings instead of a sum for each firing",
                Numbered::binPacking),
            NUMBERED),
        requiring(
            reformulation(
                "heat-element",
                "a lot's heat is looked up by the number of its firing",
                Numbered::heatElement),
            NUMBERED),
        requiring(
            reformulation(
                "out-element",
                "the day on which a lot is out is looked up by the number of its firing",
                Numbered::outElement),
            NUMBERED),
        excluding(
            reformulation(
                CHANGE_TABLE,
                "a table of two heats and the cost of the change instead of implications",
                Changeovers::table),
            CHANGE_ELEMENT),
        excluding(
            reformulation(
                CHANGE_ELEMENT,
                "the cost of a change is looked up by the two heats instead of implied by them",
                Changeovers::element),
            CHANGE_TABLE),
        reformulation(
            "glaze-flags",
            "a yes or no for each firing and glaze, and rules between these instead of lots",
            GlazeFlags::post),
        reformulation(
            "gas-cumulative",
            "one cumulative constraint for the gas main instead of a sum for each day",
            SharedLimits::gas),
        reformulation(
            "crew-cumulative",
            "one cumulative constraint for the crew instead of a sum for each day",
            SharedLimits::crew));
  }

  private static List<Amendment<Campaign>> bounds() {
    return List.of(
        implied(
            "lit-capacity",
            "a firing holds no more at a heat than its shelves times whether it has that heat",
            Capacity::lit),
        implied(
            "shelf-supply",
            "the firings at each heat have shelves for all lots that mature nowhere else",
            Capacity::supply),
        implied(
            "firings-needed",
            "as many firings at each heat as bins that hold the lots that mature nowhere else",
            Capacity::firings),
        implied(
            "exclusive-lots",
            "a firing holds at most one of lots that pairwise cannot share it",
            Conflicts::cliques),
        implied(
            "kiln-days",
            "a kiln's firings and repairs take no more days than the campaign has",
            TimeBounds::kilnDays),
        implied(
            "elapsed",
            "a firing is lit after all days that those before it take",
            TimeBounds::elapsed),
        implied(
            "earliest-out",
            "a lot is out no sooner than a firing takes from when it is dry or decorated",
            TimeBounds::earliestOut),
        implied(
            "on-time-shelves",
            "the lots that are out by each due day fit into the firings that can be over by then",
            TimeBounds::onTime),
        implied(
            "change-floor",
            "a heat that no kiln is set to has to be changed to at least once",
            Changeovers::floor));
  }

  private static List<Amendment<Campaign>> symmetries() {
    return List.of(
        new LikeLots(),
        excluding(LikeKilns.byHeat(), LikeKilns.BY_FIRINGS),
        excluding(LikeKilns.byFirings(), LikeKilns.BY_HEAT));
  }

  private static List<Amendment<Campaign>> dominances() {
    return List.of(
        dominance(
            "left-shifted",
            "a firing is lit on a day on which what it waited for was there",
            LeftShift::post),
        dominance(
            "urgent-lots",
            "of two lots that could change places, the more urgent one is out no later",
            UrgentLots::post),
        dominance(
            "room-before",
            "no lot shares a firing while the one before, as hot, has room for it",
            RoomBefore::post));
  }

  private static List<Amendment<Campaign>> searches() {
    return List.of(
        excluding(
            search(
                URGENT_FIRST,
                "decide where each lot goes, the one that is due first first",
                SearchOrders::urgentFirst),
            LARGEST_FIRST,
            HEATS_FIRST),
        excluding(
            search(
                LARGEST_FIRST,
                "decide where each lot goes, the one that fills most shelves first",
                SearchOrders::largestFirst),
            URGENT_FIRST,
            HEATS_FIRST),
        excluding(
            search(
                HEATS_FIRST,
                "decide how hot each firing is before which lots are in it",
                SearchOrders::heatsFirst),
            URGENT_FIRST,
            LARGEST_FIRST),
        search(
            "greedy-hint",
            "try the plan first that is made without looking ahead",
            SearchOrders::greedyHint));
  }
}
