package steelyard.variants.catalog.kilns;

import java.util.Collections;
import java.util.List;
import java.util.function.ToIntFunction;
import java.util.stream.IntStream;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Ints;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Term;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;

/**
 * Reformulations: what the kilns share as cumulative constraints instead of a sum for each day.
 * Days are whole, so that a sum for each day is a sum for each point in time.
 */
final class SharedLimits {
  private SharedLimits() {}

  /** A task of one day for each lit firing, of which the crew can do so many at a time. */
  static void crew(Campaign campaign, Change change) {
    if (!campaign.isCrewScarce()) {
      return;
    }
    change.withdraw(Groups.CREW);
    Board board = new Board(campaign, change::variable);
    View one = View.constant(1);
    List<Task> tasks =
        board.firings().stream()
            .map(f -> change.task("loading[" + f.name() + "]", board.start(f), one, board.isLit(f)))
            .toList();
    Views demands = Views.of(Collections.nCopies(tasks.size(), one));
    View crew = View.constant(campaign.works().crew());
    change.group(Groups.CREW).post(new Cumulative(Tasks.of(tasks), demands, crew));
  }

  /** A task for the days with burners on, as long and as hungry as the firing's heat says. */
  static void gas(Campaign campaign, Change change) {
    if (!campaign.isGasScarce()) {
      return;
    }
    change.withdraw(Groups.GAS);
    Board board = new Board(campaign, change::variable);
    List<Task> tasks =
        board.firings().stream()
            .map(
                firing -> {
                  IntVar days = byHeat("burning", firing, Heat::fire, campaign, change);
                  return change.task("burners[" + firing.name() + "]", board.start(firing), days);
                })
            .toList();
    List<IntVar> demands =
        board.firings().stream()
            .map(firing -> byHeat("gas", firing, Heat::gas, campaign, change))
            .toList();
    View main = View.constant(campaign.works().gas());
    change.group(Groups.GAS).post(new Cumulative(Tasks.of(tasks), Views.of(demands), main));
  }

  /** What the firing's heat says, 0 where it is not lit. */
  private static IntVar byHeat(
      String name, Firing firing, ToIntFunction<Heat> what, Campaign campaign, Change change) {
    IntStream lit =
        Campaign.heatsOf(campaign.kiln(firing)).map(h -> what.applyAsInt(campaign.heat(h)));
    Ints values = Ints.of(IntStream.concat(IntStream.of(0), lit).toArray());
    IntVar heat = change.variable(Names.heat(firing));
    return change.define(name + "[" + firing.name() + "]", Term.at(values, heat));
  }
}
