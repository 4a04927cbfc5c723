package steelyard.variants.catalog.kilns;

import java.util.List;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;

/** What holds of each kiln's firings. */
final class KilnRules {
  private final Campaign campaign;
  private final Draft draft;
  private final Board board;

  KilnRules(Campaign campaign, Draft draft, Board board) {
    this.campaign = campaign;
    this.draft = draft;
    this.board = board;
  }

  void post() {
    for (Firing firing : board.firings()) {
      litForSomething(firing);
      inOrder(firing);
      cycle(firing);
      unlit(firing);
      repairs(firing);
      changes(firing);
    }
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      relining(kiln);
    }
  }

  private void litForSomething(Firing firing) {
    Formula holdsLot =
        Formula.any(board.lotsFor(firing).mapToObj(lot -> board.isIn(lot, firing)).toList());
    draft.group(Groups.NO_EMPTY_FIRING).post(board.isLit(firing).implies(holdsLot));
  }

  private void inOrder(Firing firing) {
    int step = campaign.works().step();
    Group steps = draft.group(Groups.STEPS);
    if (firing.isFirst()) {
      steps.post(board.heat(firing).le(campaign.kiln(firing).set() + step));
      return;
    }
    Firing before = board.before(firing);
    draft.group(Groups.IN_ORDER).post(board.isLit(firing).implies(board.isLit(before)));
    steps.post(board.heat(firing).minus(board.heat(before)).le(step));
    draft.group(Groups.OPENED_FIRST).post(board.end(before).le(board.start(firing)));
  }

  private void cycle(Firing firing) {
    Group group = draft.group(Groups.CYCLE);
    for (int heat = 0; heat <= campaign.kiln(firing).hottest(); heat++) {
      int days = heat == 0 ? 0 : campaign.heat(heat).days();
      Term end = board.start(firing).plus(days);
      group.post(board.heat(firing).eq(heat).implies(board.end(firing).eq(end)));
    }
  }

  private void unlit(Firing firing) {
    Term end = firing.isFirst() ? Term.constant(0) : board.end(board.before(firing));
    draft.group(Groups.UNLIT).post(board.heat(firing).eq(0).implies(board.start(firing).eq(end)));
  }

  private void repairs(Firing firing) {
    for (Kiln.Repair repair : campaign.kiln(firing).repairs()) {
      Formula before = board.end(firing).le(repair.from());
      Formula after = board.start(firing).ge(repair.until());
      draft.group(Groups.REPAIRS).post(Formula.any(board.heat(firing).eq(0), before, after));
    }
  }

  private void changes(Firing firing) {
    Group group = draft.group(Groups.CHANGES);
    for (ChangeCosts.Row row : ChangeCosts.of(campaign, campaign.kiln(firing))) {
      Formula costs = board.change(firing).eq(row.cost());
      Formula isTo = board.heat(firing).eq(row.to());
      if (!firing.isFirst()) {
        Formula isFrom = board.heat(board.before(firing)).eq(row.from());
        group.post(Formula.any(isFrom.not(), isTo.not(), costs));
      } else if (row.from() == campaign.kiln(firing).set()) {
        group.post(isTo.implies(costs));
      }
    }
  }

  private void relining(int kiln) {
    int hot = campaign.kilns().get(kiln).hot();
    List<Firing> firings = board.firingsOf(kiln);
    if (hot < firings.size()) {
      int hottest = campaign.kilns().get(kiln).hottest();
      draft
          .group(Groups.RELINING)
          .post(Term.sum(firings.stream().map(f -> board.lit(f, hottest)).toList()).le(hot));
    }
  }
}
