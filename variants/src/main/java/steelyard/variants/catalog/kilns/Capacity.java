package steelyard.variants.catalog.kilns;

import java.util.function.IntPredicate;
import java.util.function.ToIntFunction;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Implied constraints on how much the firings of a heat hold and how many are needed. */
final class Capacity {
  private final Campaign campaign;
  private final Board board;

  private Capacity(Campaign campaign, Change change) {
    this.campaign = campaign;
    this.board = new Board(campaign, change::variable);
  }

  /** Heats from {@code coolest} to {@code hottest}. */
  private record Band(int coolest, int hottest) {
    IntStream heats() {
      return IntStream.rangeClosed(coolest, hottest);
    }

    /** Whether the lot matures at no other heat. */
    boolean confines(Lot lot) {
      return coolest <= lot.coolest() && lot.hottest() <= hottest;
    }
  }

  /**
   * The shelves of a firing times whether it is lit hold its lots: all of them, and those that
   * mature at one heat only, times whether it has that. Where it is not so lit there are none of
   * them, and where it is this is what the shelves hold.
   */
  static void lit(Campaign campaign, Change change) {
    Capacity it = new Capacity(campaign, change);
    Group group = change.group("shelves of a lit firing");
    for (Firing firing : it.board.firings()) {
      it.postHolds(group, firing, new Band(1, campaign.heats().size()));
      Campaign.heatsOf(campaign.kiln(firing))
          .mapToObj(heat -> new Band(heat, heat))
          .filter(band -> it.confined(band, lot -> it.board.offers(firing, lot)).count() > 0)
          .forEach(band -> it.postHolds(group, firing, band));
    }
  }

  private void postHolds(Group group, Firing firing, Band band) {
    Term shelves = board.byHeat(firing, band.heats(), heat -> campaign.kiln(firing).shelves());
    IntStream lots = confined(band, lot -> board.offers(firing, lot));
    group.post(board.shelvesOf(lots, firing).le(shelves));
  }

  /**
   * The firings of neighbouring heats have the shelves for all lots that mature at no other heat:
   * the capacities of these firings, summed up. The same holds of wide shelves and large lots.
   */
  static void supply(Campaign campaign, Change change) {
    Capacity it = new Capacity(campaign, change);
    Group group = change.group("shelves enough at each temperature");
    it.bands()
        .forEach(
            band -> {
              it.postSupply(group, band, lot -> true, false);
              it.postSupply(group, band, lot -> campaign.lot(lot).large(), true);
            });
  }

  private void postSupply(Group group, Band band, IntPredicate which, boolean isWide) {
    int demand = confined(band, which).map(lot -> campaign.lot(lot).shelves()).sum();
    if (demand > 0) {
      group.post(
          sumOfFirings(
                  band,
                  firing -> isWide ? campaign.kiln(firing).wide() : campaign.kiln(firing).shelves())
              .ge(demand));
    }
  }

  /**
   * Lots that mature at neighbouring heats only need as many firings of these as bins of the
   * largest kiln would hold them.
   */
  static void firings(Campaign campaign, Change change) {
    Capacity it = new Capacity(campaign, change);
    Group group = change.group("firings enough at each temperature");
    it.bands()
        .forEach(
            band -> {
              int needed = Math.max(it.needed(band, false), it.needed(band, true));
              if (needed > 0) {
                group.post(it.sumOfFirings(band, firing -> 1).ge(needed));
              }
            });
  }

  private int needed(Band band, boolean isWide) {
    int capacity =
        campaign.kilns().stream()
            .filter(kiln -> kiln.hottest() >= band.coolest)
            .mapToInt(kiln -> isWide ? kiln.wide() : kiln.shelves())
            .max()
            .orElse(0);
    IntStream sizes =
        confined(band, lot -> !isWide || campaign.lot(lot).large())
            .map(lot -> campaign.lot(lot).shelves());
    return BinBound.of(sizes.toArray(), capacity);
  }

  private Term sumOfFirings(Band band, ToIntFunction<Firing> weight) {
    return Term.sum(
        board.firings().stream()
            .map(f -> board.byHeat(f, band.heats(), heat -> weight.applyAsInt(f)))
            .toList());
  }

  private IntStream confined(Band band, IntPredicate which) {
    return campaign.lotNumbers().filter(lot -> band.confines(campaign.lot(lot))).filter(which);
  }

  private Stream<Band> bands() {
    return board
        .heats()
        .boxed()
        .flatMap(
            coolest ->
                board
                    .heats()
                    .filter(hottest -> hottest >= coolest)
                    .mapToObj(hottest -> new Band(coolest, hottest)));
  }
}
