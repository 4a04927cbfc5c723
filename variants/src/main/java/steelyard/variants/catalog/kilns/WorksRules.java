package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;

/** What the kilns share: on each day a crew and a gas main. */
final class WorksRules {
  private final Campaign campaign;
  private final Draft draft;
  private final Board board;

  WorksRules(Campaign campaign, Draft draft, Board board) {
    this.campaign = campaign;
    this.draft = draft;
    this.board = board;
  }

  void post() {
    for (int day = 0; day < campaign.works().days(); day++) {
      if (campaign.isCrewScarce()) {
        crew(day);
      }
      if (campaign.isGasScarce()) {
        gas(day);
      }
    }
  }

  private void crew(int day) {
    List<Term> loaded = new ArrayList<>();
    for (Firing firing : board.firings()) {
      loaded.add(Term.truth(board.isLit(firing).and(board.start(firing).eq(day))));
    }
    draft.group(Groups.CREW).post(Term.sum(loaded).le(campaign.works().crew()));
  }

  private void gas(int day) {
    List<Term> used = new ArrayList<>();
    for (Firing firing : board.firings()) {
      Campaign.heatsOf(campaign.kiln(firing))
          .forEach(
              number -> {
                Heat heat = campaign.heat(number);
                Formula burns =
                    Formula.all(
                        board.heat(firing).eq(number),
                        board.start(firing).le(day),
                        board.start(firing).ge(day - heat.fire() + 1));
                used.add(Term.truth(burns).times(heat.gas()));
              });
    }
    draft.group(Groups.GAS).post(Term.sum(used).le(campaign.works().gas()));
  }
}
