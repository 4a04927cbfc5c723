package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Dominance: a firing is lit on the first day, or on one on which something made it wait for that
 * day: its kiln was opened or repaired, one of its lots became dry or decorated, the day before the
 * crew loaded another kiln, or another kiln's burners went out.
 *
 * <p>Of the cheapest plans take one with the smallest sum of starts. A firing for which none of
 * this holds could be lit a day earlier: the kiln is free and no repair ends, its lots are ready,
 * the crew loads no other kiln that day. The gas main suffices too, as every other kiln that burns
 * on the day before burns on the first day of the firing as well, where both have enough. Its lots
 * are out a day earlier, which costs no more and hinders no second fire; the sum would be smaller.
 * (Such plans are called semi-active; Sprecher, Kolisch and Drexl, 1995, EJOR 80(1):94-102.)
 */
final class LeftShift {
  private final Campaign campaign;
  private final Board board;
  private final Group group;

  private LeftShift(Campaign campaign, Change change) {
    this.campaign = campaign;
    this.board = new Board(campaign, change::variable);
    this.group = change.group("no waiting for nothing");
  }

  static void post(Campaign campaign, Change change) {
    LeftShift it = new LeftShift(campaign, change);
    it.board.firings().forEach(firing -> it.group.post(Formula.any(it.reasons(firing))));
  }

  private List<Formula> reasons(Firing firing) {
    List<Formula> reasons = new ArrayList<>();
    Term start = board.start(firing);
    reasons.add(board.heat(firing).eq(0));
    reasons.add(start.eq(0));
    if (!firing.isFirst()) {
      reasons.add(start.eq(board.end(board.before(firing))));
    }
    for (Kiln.Repair repair : campaign.kiln(firing).repairs()) {
      reasons.add(start.eq(repair.until()));
    }
    board
        .lotsFor(firing)
        .filter(lot -> campaign.lot(lot).dry() > 0)
        .forEach(
            lot -> reasons.add(board.isIn(lot, firing).and(start.eq(campaign.lot(lot).dry()))));
    for (SecondFire pair : campaign.seconds()) {
      if (board.offers(firing, pair.second())) {
        Formula isReady = start.eq(board.out(pair.first()).plus(pair.days()));
        reasons.add(board.isIn(pair.second(), firing).and(isReady));
      }
    }
    board.firings().stream()
        .filter(other -> other.kiln() != firing.kiln())
        .forEach(other -> addShared(firing, other, reasons));
    return reasons;
  }

  /** The crew or the burners of another kiln. */
  private void addShared(Firing firing, Firing other, List<Formula> reasons) {
    Term start = board.start(firing);
    if (campaign.isCrewScarce()) {
      reasons.add(board.isLit(other).and(start.eq(board.start(other).plus(1))));
    }
    if (campaign.isGasScarce()) {
      Campaign.heatsOf(campaign.kiln(other))
          .forEach(
              heat -> {
                Term burnt = board.start(other).plus(campaign.heat(heat).fire());
                reasons.add(board.heat(other).eq(heat).and(start.eq(burnt)));
              });
    }
  }
}
