package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Dominance: no lot shares a firing with others while the one before it in the same kiln, at the
 * same heat and late enough for the lot to be dry, has room for it and nothing that spoils it. Of
 * lots with a plain glaze that nothing ties to others.
 *
 * <p>Of the cheapest plans take one with the smallest sum of starts, of these one with the smallest
 * sum of the lots' positions. Such a lot could go into the firing before: it matures there, is dry
 * and has shelves, leaves nobody's firing empty, neither gives nor takes up vapours, and is out
 * earlier. Starts stay, the sum of positions would be smaller.
 */
final class RoomBefore {
  private final Campaign campaign;
  private final Change change;
  private final Board board;
  private final Group group;

  private RoomBefore(Campaign campaign, Change change) {
    this.campaign = campaign;
    this.change = change;
    this.board = new Board(campaign, change::variable);
    this.group = change.group("no lot waits while there is room for it");
  }

  static void post(Campaign campaign, Change change) {
    RoomBefore it = new RoomBefore(campaign, change);
    for (Firing firing : it.board.firings()) {
      if (!firing.isFirst()) {
        it.post(firing);
      }
    }
  }

  private void post(Firing firing) {
    Firing before = board.before(firing);
    int[] lots = board.lotsFor(firing).toArray();
    String name = firing.name() + "]";
    IntVar isSame = change.define("same[" + name, board.heat(firing).eq(board.heat(before)));
    Term held = Term.sum(IntStream.of(lots).mapToObj(lot -> board.in(lot, firing)).toList());
    IntVar isShared = change.define("shared[" + name, held.ge(2));
    IntVar load = change.define("loadbefore[" + name, board.shelvesOf(IntStream.of(lots), before));
    IntVar wide =
        change.define(
            "widebefore[" + name,
            board.shelvesOf(IntStream.of(lots).filter(lot -> campaign.lot(lot).large()), before));
    for (int lot : lots) {
      if (campaign.kind(campaign.lot(lot)) == Glaze.Kind.PLAIN && !campaign.isTied(lot)) {
        List<Formula> ways = new ArrayList<>();
        ways.add(board.isIn(lot, firing).not());
        ways.add(Board.isTrue(isSame).not());
        ways.add(Board.isTrue(isShared).not());
        ways.addAll(hindrances(lot, before, load, wide));
        group.post(Formula.any(ways));
      }
    }
  }

  /** What keeps the lot out of a firing of its heat. */
  private List<Formula> hindrances(int index, Firing firing, IntVar load, IntVar wide) {
    Lot lot = campaign.lot(index);
    List<Formula> ways = new ArrayList<>();
    ways.add(board.start(firing).lt(lot.dry()));
    ways.add(load.gt(campaign.kiln(firing).shelves() - lot.shelves()));
    if (lot.large()) {
      ways.add(wide.gt(campaign.kiln(firing).wide() - lot.shelves()));
    }
    board
        .lotsFor(firing)
        .filter(other -> campaign.areSpoilers(lot, campaign.lot(other)))
        .forEach(other -> ways.add(board.isIn(other, firing)));
    return ways;
  }
}
