package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Dominance: of two lots that fill the same shelves, mature at the same heats, have the same glaze
 * and are dry on the same day, the more urgent one is out no later. It is due and sails no later,
 * each day costs no less, and something of that differs; neither is tied to others.
 *
 * <p>Let the more urgent lot l be out on day e, the other, m, on an earlier day d. They can change
 * places: shelves, glazes, heats and days of drying are alike, l sails no later than m and was out
 * on day e. For l the days from d to e cost no less than they do for m, whose due day is no sooner
 * and whose rate is no higher. Of the cheapest plans take one with the largest sum of r·out, with r
 * rising from more to less urgent lots: the change would make it larger.
 *
 * <p>Firings keep their days, and what dries when, so that {@link LeftShift} and {@link RoomBefore}
 * can be had beside this: take first the smallest sum of starts, then of positions, then this.
 */
final class UrgentLots {
  private UrgentLots() {}

  static void post(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("the more urgent of two lots is out no later");
    for (Pair pair : pairs(campaign)) {
      group.post(board.out(pair.one()).le(board.out(pair.other())));
    }
  }

  /** The more urgent one first; without pairs that follow from two others. */
  private static List<Pair> pairs(Campaign campaign) {
    List<Pair> pairs = new ArrayList<>();
    for (int one = 0; one < campaign.lots().size(); one++) {
      for (int other = 0; other < campaign.lots().size(); other++) {
        int l = one;
        int m = other;
        if (isMoreUrgent(l, m, campaign)
            && campaign
                .lotNumbers()
                .noneMatch(k -> isMoreUrgent(l, k, campaign) && isMoreUrgent(k, m, campaign))) {
          pairs.add(new Pair(l, m));
        }
      }
    }
    return pairs;
  }

  private static boolean isMoreUrgent(int one, int other, Campaign campaign) {
    Lot l = campaign.lot(one);
    Lot m = campaign.lot(other);
    boolean isExchangeable =
        l.shelves() == m.shelves()
            && l.large() == m.large()
            && l.coolest() == m.coolest()
            && l.hottest() == m.hottest()
            && l.glaze() == m.glaze()
            && l.dry() == m.dry();
    return isExchangeable
        && !l.isLike(m)
        && l.due() <= m.due()
        && l.rate() >= m.rate()
        && l.latest().orElse(Integer.MAX_VALUE) <= m.latest().orElse(Integer.MAX_VALUE)
        && !campaign.isTied(one)
        && !campaign.isTied(other);
  }
}
