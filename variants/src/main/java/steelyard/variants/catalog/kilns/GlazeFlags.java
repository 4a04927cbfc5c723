package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Reformulation: a yes or no for each firing and glaze, whether it holds a lot of that glaze, and
 * rules between these instead of rules between lots. A firing holds two lots whose glazes are at
 * odds exactly where it holds both glazes.
 */
final class GlazeFlags {
  private final Campaign campaign;
  private final Change change;
  private final Board board;

  private GlazeFlags(Campaign campaign, Change change) {
    this.campaign = campaign;
    this.change = change;
    this.board = new Board(campaign, change::variable);
  }

  static void post(Campaign campaign, Change change) {
    GlazeFlags flags = new GlazeFlags(campaign, change);
    for (Firing firing : flags.board.firings()) {
      flags.glazes(glaze -> true).forEach(glaze -> flags.define(firing, glaze));
    }
    flags.spoilersApart();
    flags.paleAfterFuming();
  }

  private void spoilersApart() {
    if (campaign.spoilingLots().stream().noneMatch(pair -> isPosted(pair, 1))) {
      return;
    }
    change.withdraw(Groups.SPOILERS_APART);
    Group group = change.group(Groups.SPOILERS_APART);
    for (Firing firing : board.firings()) {
      for (Pair pair : campaign.spoilers()) {
        group.post(lacks(firing, pair.one()).or(lacks(firing, pair.other())));
      }
    }
  }

  private void paleAfterFuming() {
    boolean isPosted =
        campaign
            .lotsOf(Glaze.Kind.FUMING)
            .anyMatch(
                fuming ->
                    campaign
                        .lotsOf(Glaze.Kind.PALE)
                        .anyMatch(pale -> isPosted(new Pair(fuming, pale), 2)));
    if (!isPosted) {
      return;
    }
    change.withdraw(Groups.PALE_AFTER_FUMING);
    Group group = change.group(Groups.PALE_AFTER_FUMING);
    for (Firing firing : board.firings()) {
      if (!firing.isFirst()) {
        glazes(isOf(Glaze.Kind.FUMING))
            .forEach(
                fuming ->
                    glazes(isOf(Glaze.Kind.PALE))
                        .forEach(
                            pale ->
                                group.post(
                                    lacks(board.before(firing), fuming).or(lacks(firing, pale)))));
      }
    }
  }

  /** Whether some kiln can take both lots, and has so many firings for them. */
  private boolean isPosted(Pair pair, int firings) {
    return campaign.kilns().stream()
        .filter(kiln -> kiln.firings() >= firings)
        .anyMatch(
            kiln ->
                campaign.takes(kiln, campaign.lot(pair.one()))
                    && campaign.takes(kiln, campaign.lot(pair.other())));
  }

  private IntPredicate isOf(Glaze.Kind kind) {
    return glaze -> campaign.glazes().get(glaze).kind() == kind;
  }

  private IntStream glazes(IntPredicate which) {
    return IntStream.range(0, campaign.glazes().size()).filter(which);
  }

  private void define(Firing firing, int glaze) {
    List<Formula> lots =
        board
            .lotsFor(firing)
            .filter(lot -> campaign.lot(lot).glaze() == glaze)
            .mapToObj(lot -> board.isIn(lot, firing))
            .toList();
    change.define(name(firing, glaze), Formula.any(lots));
  }

  private Formula lacks(Firing firing, int glaze) {
    IntVar flag = change.variable(name(firing, glaze));
    return Formula.literal(flag.view().atMost(0));
  }

  private String name(Firing firing, int glaze) {
    return "holds[" + firing.name() + "," + campaign.glazes().get(glaze).name() + "]";
  }
}
