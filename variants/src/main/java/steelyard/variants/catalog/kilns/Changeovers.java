package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.OptionalInt;
import java.util.stream.IntStream;
import steelyard.variants.model.Element;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Table;
import steelyard.variants.model.Term;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * The cost of changing the temperature in other words. Plain has an implication for each pair of
 * heats that can follow each other; as every pair that can occur has one, the cost is what the list
 * of pairs says, be it posted as a table or looked up by the number of the pair.
 */
final class Changeovers {
  private Changeovers() {}

  /** Reformulation: the list of pairs with their costs as a table. */
  static void table(Campaign campaign, Change change) {
    change.withdraw(Groups.CHANGES);
    Board board = new Board(campaign, change::variable);
    Group group = change.group(Groups.CHANGES);
    for (Firing firing : board.firings()) {
      Kiln kiln = campaign.kiln(firing);
      List<ChangeCosts.Row> rows = ChangeCosts.of(campaign, kiln);
      IntVar heat = board.heat(firing);
      IntVar cost = board.change(firing);
      if (firing.isFirst()) {
        List<int[]> first =
            rows.stream()
                .filter(row -> row.from() == kiln.set())
                .map(row -> new int[] {row.to(), row.cost()})
                .toList();
        group.post(new Table(Views.of(heat, cost), Tuples.of(2, first), Table.Polarity.ALLOWED));
      } else {
        List<int[]> all =
            rows.stream().map(row -> new int[] {row.from(), row.to(), row.cost()}).toList();
        Views scope = Views.of(board.heat(board.before(firing)), heat, cost);
        group.post(new Table(scope, Tuples.of(3, all), Table.Polarity.ALLOWED));
      }
    }
  }

  /**
   * Reformulation: the costs in an array, at the place that the two heats give. Pairs that cannot
   * be, a heat after an unlit firing, are ruled out by the order of firings.
   */
  static void element(Campaign campaign, Change change) {
    change.withdraw(Groups.CHANGES);
    Board board = new Board(campaign, change::variable);
    Group group = change.group(Groups.CHANGES);
    for (Firing firing : board.firings()) {
      Kiln kiln = campaign.kiln(firing);
      IntVar heat = board.heat(firing);
      IntVar cost = board.change(firing);
      if (firing.isFirst()) {
        group.post(
            new Element(costs(campaign, kiln, kiln.set(), kiln.set()), heat.view(), cost.view()));
      } else {
        IntVar before = board.heat(board.before(firing));
        IntVar turn =
            change.define(
                "turn[" + firing.name() + "]", before.times(kiln.hottest() + 1).plus(heat));
        group.post(new Element(costs(campaign, kiln, 0, kiln.hottest()), turn.view(), cost.view()));
      }
    }
  }

  /** The costs from each of the heats to each. */
  private static Views costs(Campaign campaign, Kiln kiln, int from, int until) {
    return Views.ofConstants(
        IntStream.rangeClosed(from, until)
            .flatMap(
                before ->
                    IntStream.rangeClosed(0, kiln.hottest())
                        .map(
                            heat ->
                                before == 0 || heat == 0 ? 0 : campaign.change(kiln, before, heat)))
            .toArray());
  }

  /**
   * Implied: a heat at which alone some lot matures, and to which no kiln is set, has to be changed
   * to somewhere, for no less than the cheapest such change; changes to different heats are
   * different changes.
   */
  static void floor(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    int floor = board.heats().map(heat -> cheapestTo(heat, campaign)).sum();
    if (floor > 0) {
      change
          .group("temperatures that must be changed to")
          .post(Term.sum(board.firings().stream().map(board::change).toList()).ge(floor));
    }
  }

  private static int cheapestTo(int heat, Campaign campaign) {
    boolean isNeeded =
        campaign.lots().stream().anyMatch(lot -> lot.coolest() == heat && lot.hottest() == heat);
    if (!isNeeded || campaign.kilns().stream().anyMatch(kiln -> kiln.set() == heat)) {
      return 0;
    }
    OptionalInt cheapest =
        campaign.kilns().stream()
            .filter(kiln -> kiln.hottest() >= heat)
            .flatMapToInt(
                kiln ->
                    Campaign.heatsOf(kiln)
                        .filter(from -> from != heat)
                        .map(from -> campaign.change(kiln, from, heat)))
            .min();
    return cheapest.orElse(0);
  }
}
