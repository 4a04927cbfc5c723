package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import steelyard.variants.model.Branching.ValueOrder;
import steelyard.variants.model.Branching.VariableOrder;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/** Branchings and a hint; they change no solutions. */
final class SearchOrders {
  private SearchOrders() {}

  /** Lot by lot, the one that is due first first, each into the first firing that there is. */
  static void urgentFirst(Campaign campaign, Change change) {
    Comparator<Integer> byDue = Comparator.comparingInt(lot -> campaign.lot(lot).due());
    byLot(campaign, change, byDue.thenComparingInt(lot -> -campaign.lot(lot).rate()));
  }

  /**
   * Lot by lot, the one that fills most shelves first, each into the first firing that there is.
   */
  static void largestFirst(Campaign campaign, Change change) {
    Comparator<Integer> bySize = Comparator.comparingInt(lot -> -campaign.lot(lot).shelves());
    byLot(campaign, change, bySize.thenComparingInt(lot -> campaign.lot(lot).due()));
  }

  private static void byLot(Campaign campaign, Change change, Comparator<Integer> order) {
    Board board = new Board(campaign, change::variable);
    List<IntVar> yeses = new ArrayList<>();
    for (int lot : campaign.lotNumbers().boxed().sorted(order).toList()) {
      board.choices(lot).stream()
          .sorted(Comparator.comparingInt(Firing::position))
          .forEach(firing -> yeses.add(board.in(lot, firing)));
    }
    change.branch(Views.of(yeses), VariableOrder.INPUT, ValueOrder.MAX);
    heatsThenStarts(change, board, ValueOrder.MIN);
  }

  /** The heats of all firings first, then who goes where. */
  static void heatsFirst(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    heatsThenStarts(change, board, ValueOrder.MEDIAN);
  }

  private static void heatsThenStarts(Change change, Board board, ValueOrder heat) {
    List<IntVar> heats =
        board.firings().stream()
            .sorted(Comparator.comparingInt(Firing::position))
            .map(board::heat)
            .toList();
    List<IntVar> starts = board.firings().stream().map(board::start).toList();
    change.branch(Views.of(heats), VariableOrder.INPUT, heat);
    change.branch(Views.of(starts), VariableOrder.SMALLEST_MIN, ValueOrder.MIN);
  }

  /** The greedy plan, where there is one. */
  static void greedyHint(Campaign campaign, Change change) {
    GreedyPlan.of(campaign)
        .ifPresent(
            plan ->
                plan.decisions(campaign)
                    .forEach((name, value) -> change.hint(change.variable(name), value)));
  }
}
