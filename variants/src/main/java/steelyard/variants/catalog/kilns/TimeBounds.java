package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints on days. */
final class TimeBounds {
  private TimeBounds() {}

  /**
   * A kiln's firings take no more days than the campaign has beside repairs: they do not overlap
   * each other or repairs, and all are over when the campaign is.
   */
  static void kilnDays(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("a kiln's days");
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      int repairs = campaign.kilns().get(kiln).repairs().stream().mapToInt(Kiln.Repair::days).sum();
      Term used = days(board.firingsOf(kiln), campaign, board);
      group.post(used.le(campaign.works().days() - repairs));
    }
  }

  /** A firing is lit after all days that those before it in its kiln take, one after the other. */
  static void elapsed(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("days before a firing");
    for (Firing firing : board.firings()) {
      if (!firing.isFirst()) {
        List<Firing> before = board.firingsOf(firing.kiln()).subList(0, firing.position());
        group.post(days(before, campaign, board).le(board.start(firing)));
      }
    }
  }

  private static Term days(List<Firing> firings, Campaign campaign, Board board) {
    return Term.sum(
        firings.stream()
            .map(f -> board.byHeat(f, board.heats(), heat -> campaign.heat(heat).days()))
            .toList());
  }

  /**
   * A lot is out no sooner than the shortest firing in which it matures takes from the day on which
   * it is dry, or decorated after its first fire: its firing starts no sooner and takes no less.
   */
  static void earliestOut(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("no lot out before it can be");
    campaign
        .lotNumbers()
        .forEach(
            lot ->
                group.post(board.out(lot).ge(campaign.lot(lot).dry() + shortest(campaign, lot))));
    for (SecondFire pair : campaign.seconds()) {
      int least = pair.days() + shortest(campaign, pair.second());
      group.post(board.out(pair.first()).plus(least).le(board.out(pair.second())));
    }
  }

  private static int shortest(Campaign campaign, int lot) {
    return IntStream.rangeClosed(campaign.lot(lot).coolest(), campaign.lot(lot).hottest())
        .map(heat -> campaign.heat(heat).days())
        .min()
        .orElseThrow();
  }

  /**
   * Lots that are due by a day and not late are out by that day, and by then each kiln has been
   * opened no more often than its shortest firings allow; that many firings have to hold them.
   */
  static void onTime(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("shelves enough by each due day");
    int[] days = campaign.lots().stream().mapToInt(Lot::due).sorted().distinct().toArray();
    for (int day : days) {
      int[] due = campaign.lotNumbers().filter(l -> campaign.lot(l).due() <= day).toArray();
      long demand = IntStream.of(due).mapToLong(lot -> campaign.lot(lot).shelves()).sum();
      long supply = campaign.kilns().stream().mapToLong(k -> shelvesBy(day, k, campaign)).sum();
      if (demand > supply) {
        group.post(
            Term.sum(
                    IntStream.of(due)
                        .mapToObj(lot -> timelyShelves(campaign.lot(lot), board.late(lot)))
                        .toList())
                .le(supply));
      }
    }
  }

  private static Term timelyShelves(Lot lot, Term late) {
    return Term.truth(late.le(0)).times(lot.shelves());
  }

  private static long shelvesBy(int day, Kiln kiln, Campaign campaign) {
    int shortest =
        Campaign.heatsOf(kiln).map(heat -> campaign.heat(heat).days()).min().orElseThrow();
    return (long) Math.min(kiln.firings(), day / shortest) * kiln.shelves();
  }
}
