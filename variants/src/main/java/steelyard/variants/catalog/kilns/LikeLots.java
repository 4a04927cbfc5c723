package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.Formula;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Lots that only their names tell apart can change places in any plan. Exactly one way of sharing
 * out their places has their firings ascending.
 */
final class LikeLots implements Amendment<Campaign> {
  static final String NAME = "like-lots";

  @Override
  public String name() {
    return NAME;
  }

  @Override
  public String summary() {
    return "of lots that are alike, the earlier in the list is in the earlier firing of the list";
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  @Override
  public Role role(Campaign campaign) {
    return new Role.Symmetry(alike(campaign).stream().map(p -> exchange(p, campaign)).toList());
  }

  /** Where the later lot is in a firing, the earlier one is in that or in one before it. */
  @Override
  public void apply(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("lots that are alike in the order of the list");
    for (Pair pair : alike(campaign)) {
      List<Formula> ways = new ArrayList<>();
      for (Firing firing : board.choices(pair.one())) {
        ways.add(board.isIn(pair.one(), firing));
        List<Formula> clause = new ArrayList<>(ways);
        clause.add(board.isIn(pair.other(), firing).not());
        group.post(Formula.any(clause));
      }
    }
  }

  /** Each lot with the next that is like it, of those that nothing ties to others. */
  static List<Pair> alike(Campaign campaign) {
    List<Pair> pairs = new ArrayList<>();
    Map<Lot, Integer> latest = new HashMap<>();
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      if (!campaign.isTied(lot)) {
        Integer before = latest.put(campaign.lot(lot).named(""), lot);
        if (before != null) {
          pairs.add(new Pair(before, lot));
        }
      }
    }
    return pairs;
  }

  private static Permutation exchange(Pair pair, Campaign campaign) {
    Map<String, String> images = new TreeMap<>();
    Lot one = campaign.lot(pair.one());
    Lot other = campaign.lot(pair.other());
    for (Firing firing : campaign.firings()) {
      if (campaign.takes(campaign.kiln(firing), one)) {
        exchange(Names.in(one, firing), Names.in(other, firing), images);
      }
    }
    exchange(Names.out(one), Names.out(other), images);
    return Permutation.of(images);
  }

  private static void exchange(String one, String other, Map<String, String> images) {
    images.put(one, other);
    images.put(other, one);
  }
}
