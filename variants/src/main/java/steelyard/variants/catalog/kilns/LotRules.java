package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;

/** What holds of lots in the firings that they go into. */
final class LotRules {
  private final Campaign campaign;
  private final Draft draft;
  private final Board board;

  LotRules(Campaign campaign, Draft draft, Board board) {
    this.campaign = campaign;
    this.draft = draft;
    this.board = board;
  }

  void post() {
    campaign.lotNumbers().forEach(this::inOneFiring);
    campaign.lotNumbers().forEach(this::atItsHeat);
    board.firings().forEach(this::onShelves);
    spoilersApart();
    paleAfterFuming();
    campaign.together().forEach(this::together);
    campaign.lotNumbers().forEach(this::inTime);
    campaign.seconds().forEach(this::secondFire);
  }

  private void inOneFiring(int lot) {
    Term times = Term.sum(board.choices(lot).stream().map(f -> board.in(lot, f)).toList());
    draft.group(Groups.EACH_LOT_ONCE).post(times.eq(1));
  }

  private void atItsHeat(int lot) {
    Group group = draft.group(Groups.AT_ITS_HEAT);
    for (Firing firing : board.choices(lot)) {
      Formula isIn = board.isIn(lot, firing);
      group.post(isIn.implies(board.heat(firing).ge(campaign.lot(lot).coolest())));
      group.post(isIn.implies(board.heat(firing).le(campaign.lot(lot).hottest())));
    }
  }

  private void onShelves(Firing firing) {
    Kiln kiln = campaign.kiln(firing);
    draft
        .group(Groups.SHELVES)
        .post(board.shelvesOf(board.lotsFor(firing), firing).le(kiln.shelves()));
    int[] large = board.lotsFor(firing).filter(lot -> campaign.lot(lot).large()).toArray();
    if (large.length > 0) {
      draft
          .group(Groups.WIDE_SHELVES)
          .post(board.shelvesOf(IntStream.of(large), firing).le(kiln.wide()));
    }
  }

  private void spoilersApart() {
    Group group = draft.group(Groups.SPOILERS_APART);
    for (Pair pair : campaign.spoilingLots()) {
      for (Firing firing : board.choices(pair.one())) {
        if (board.offers(firing, pair.other())) {
          group.post(board.notBoth(pair.one(), firing, pair.other(), firing));
        }
      }
    }
  }

  private void paleAfterFuming() {
    Group group = draft.group(Groups.PALE_AFTER_FUMING);
    int[] fuming = campaign.lotsOf(Glaze.Kind.FUMING).toArray();
    int[] pale = campaign.lotsOf(Glaze.Kind.PALE).toArray();
    for (Firing firing : board.firings()) {
      if (!firing.isFirst()) {
        Firing before = board.before(firing);
        for (int one : fuming) {
          for (int other : pale) {
            if (board.offers(before, one) && board.offers(firing, other)) {
              group.post(board.notBoth(one, before, other, firing));
            }
          }
        }
      }
    }
  }

  private void together(Pair pair) {
    Group group = draft.group(Groups.TOGETHER);
    for (Firing firing : board.firings()) {
      List<Formula> sides = new ArrayList<>();
      for (int lot : new int[] {pair.one(), pair.other()}) {
        sides.add(board.offers(firing, lot) ? board.isIn(lot, firing) : Formula.any());
      }
      group.post(sides.get(0).iff(sides.get(1)));
    }
  }

  private void inTime(int lot) {
    for (Firing firing : board.choices(lot)) {
      Formula isIn = board.isIn(lot, firing);
      draft.group(Groups.DRY).post(isIn.implies(board.start(firing).ge(campaign.lot(lot).dry())));
      draft.group(Groups.OUT).post(isIn.implies(board.out(lot).eq(board.end(firing))));
    }
    campaign
        .lot(lot)
        .latest()
        .ifPresent(latest -> draft.group(Groups.LATEST).post(board.out(lot).le(latest)));
  }

  private void secondFire(SecondFire pair) {
    for (Firing firing : board.choices(pair.second())) {
      Term ready = board.out(pair.first()).plus(pair.days());
      draft
          .group(Groups.SECOND_FIRE)
          .post(board.isIn(pair.second(), firing).implies(ready.le(board.start(firing))));
    }
  }
}
