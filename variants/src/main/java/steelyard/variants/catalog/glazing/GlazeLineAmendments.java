package steelyard.variants.catalog.glazing;

import static steelyard.variants.family.Amendments.dominance;
import static steelyard.variants.family.Amendments.excluding;
import static steelyard.variants.family.Amendments.implied;
import static steelyard.variants.family.Amendments.reformulation;
import static steelyard.variants.family.Amendments.requiring;
import static steelyard.variants.family.Amendments.search;

import java.util.List;
import steelyard.variants.family.Amendment;

/** The glazing line's amendments, in the order in which they apply. */
final class GlazeLineAmendments {
  private static final String AMONG = "among-windows";
  private static final String AUTOMATA = "window-automata";
  private static final String RUNNING_COUNTS = "running-counts";
  private static final String BY_TREATMENT = "treatment-by-treatment";
  private static final String BY_SLOT = "slot-by-slot";
  private static final String MIDDLE_OUT = "middle-out";

  private GlazeLineAmendments() {}

  static List<Amendment<GlazeLine>> all() {
    return List.of(
        reformulation(
            "cardinality",
            "one global cardinality constraint instead of a count for each kind",
            DemandForms::cardinality),
        excluding(
            reformulation(
                AMONG,
                "the kinds in a window are counted instead of the treatments that they need",
                WindowForms::among),
            AUTOMATA,
            RUNNING_COUNTS),
        excluding(
            reformulation(
                AUTOMATA,
                "one automaton for each treatment instead of a sum for each window",
                WindowForms::automata),
            AMONG,
            RUNNING_COUNTS),
        excluding(
            reformulation(
                RUNNING_COUNTS,
                "running counts of each treatment, of which a window is a difference",
                WindowForms::runningCounts),
            AMONG,
            AUTOMATA),
        reformulation(
            "run-automaton",
            "one automaton over the glazes instead of a clause for each run that is too long",
            RunForms::automaton),
        implied(
            "treatment-totals",
            "all tiles with a treatment pass: one sum over the line",
            Surrogates::totals),
        implied(
            "surrogate-demand",
            "what the last windows cannot take must have passed before",
            Surrogates::demand),
        requiring(
            implied(
                "running-bounds",
                "each running count is what it must be by then and what it can be",
                Surrogates::runningBounds),
            RUNNING_COUNTS),
        implied(
            "kind-table",
            "a slot's kind and all its treatments are a row of the table of kinds",
            KindTables::rows),
        implied(
            "kind-lookup",
            "each treatment of a slot is looked up by the slot's kind",
            KindTables::lookup),
        implied(
            "neighbours",
            "the kinds of two tiles in a row are a pair that no rule forbids by itself",
            KindTables::neighbours),
        implied(
            "glaze-runs",
            "there are as many changes of glaze as the runs that the glazes need, but one",
            CostBounds::glazeRuns),
        implied(
            "least-overruns",
            "at least so many windows have too many as the tiles do not fit into the others",
            CostBounds::overruns),
        dominance(
            "greedy-cost",
            "no dearer than the order that is made without looking ahead",
            CostBounds::greedyCost),
        new MirrorOrder(),
        excluding(
            search(
                BY_TREATMENT,
                "decide the scarcest treatment all along the line, then the next",
                SearchOrders::treatmentByTreatment),
            BY_SLOT,
            MIDDLE_OUT),
        excluding(
            search(
                BY_SLOT,
                "decide slot after slot: a tile with the scarcest treatments that go there",
                SearchOrders::slotBySlot),
            BY_TREATMENT,
            MIDDLE_OUT),
        excluding(
            search(
                MIDDLE_OUT,
                "decide slot after slot from the middle of the line to its ends",
                SearchOrders::middleOut),
            BY_TREATMENT,
            BY_SLOT),
        search(
            "greedy-hint",
            "try the order first that is made without looking ahead",
            SearchOrders::greedyHint));
  }
}
