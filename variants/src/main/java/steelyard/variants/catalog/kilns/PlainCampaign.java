package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import steelyard.variants.model.Domain;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;

/**
 * The plain model: a yes or no for each lot and firing, a heat and days for each firing, a day on
 * which each lot is out. All but the yeses, heats and starts follow from these.
 */
final class PlainCampaign {
  private final Campaign campaign;
  private final Draft draft;
  private final Board board;
  private final Map<String, IntVar> variables = new HashMap<>();

  private PlainCampaign(Campaign campaign, Draft draft) {
    this.campaign = campaign;
    this.draft = draft;
    this.board = new Board(campaign, variables::get);
  }

  static void write(Campaign campaign, Draft draft) {
    PlainCampaign model = new PlainCampaign(campaign, draft);
    model.declare();
    new LotRules(campaign, draft, model.board).post();
    new KilnRules(campaign, draft, model.board).post();
    new WorksRules(campaign, draft, model.board).post();
    draft.minimize(model.cost());
  }

  private void declare() {
    int days = campaign.works().days();
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      for (Firing firing : board.choices(lot)) {
        own(draft.bool(Names.in(campaign.lot(lot), firing)));
      }
    }
    for (Firing firing : board.firings()) {
      Kiln kiln = campaign.kiln(firing);
      own(draft.integer(Names.heat(firing), 0, kiln.hottest()));
      own(draft.integer(Names.change(firing), changes(kiln)));
      own(draft.integer(Names.start(firing), 0, days));
      own(draft.integer(Names.end(firing), 0, days));
    }
    for (Lot lot : campaign.lots()) {
      own(draft.integer(Names.out(lot), 0, days));
    }
    for (Firing firing : board.firings()) {
      Campaign.heatsOf(campaign.kiln(firing))
          .forEach(heat -> own(draft.define(Names.lit(firing, heat), board.heat(firing).eq(heat))));
    }
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      Term late = board.out(lot).minus(campaign.lot(lot).due());
      own(draft.define(Names.late(campaign.lot(lot)), Term.max(Term.constant(0), late)));
    }
  }

  private void own(IntVar variable) {
    variables.put(variable.name(), variable);
  }

  /** What a change of temperature can cost the kiln. */
  private Domain changes(Kiln kiln) {
    IntStream costs =
        Campaign.heatsOf(kiln)
            .flatMap(from -> Campaign.heatsOf(kiln).map(to -> campaign.change(kiln, from, to)));
    return Domain.of(IntStream.concat(IntStream.of(0), costs));
  }

  private Term cost() {
    List<Term> terms = new ArrayList<>();
    for (Firing firing : board.firings()) {
      Kiln kiln = campaign.kiln(firing);
      Campaign.heatsOf(kiln)
          .forEach(heat -> terms.add(board.lit(firing, heat).times(kiln.fuelAt(heat))));
      terms.add(board.change(firing));
    }
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      terms.add(board.late(lot).times(campaign.lot(lot).rate()));
    }
    return Term.sum(terms);
  }
}
