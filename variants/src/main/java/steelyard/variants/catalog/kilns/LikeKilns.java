package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.variants.family.Amendment;
import steelyard.variants.model.Permutation;
import steelyard.variants.model.Role;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Kilns that only their names tell apart can exchange everything that is done in them. Of each plan
 * and its exchanges, one has what is compared descending from kiln to kiln.
 */
final class LikeKilns implements Amendment<Campaign> {
  static final String BY_HEAT = "kilns-by-heat";
  static final String BY_FIRINGS = "kilns-by-firings";

  private static final int COMPARED = 3;

  private final String name;
  private final String summary;
  private final Order order;

  private LikeKilns(String name, String summary, Order order) {
    this.name = name;
    this.summary = summary;
    this.order = order;
  }

  /** What makes one of two kilns come first. */
  private interface Order {
    void post(List<Firing> one, List<Firing> other, Board board, Group group);
  }

  /** The heats of the first firings as the digits of a number; compared by these numbers. */
  static LikeKilns byHeat() {
    return new LikeKilns(
        BY_HEAT,
        "of kilns that are alike, the earlier in the list has the hotter first firings",
        (one, other, board, group) -> group.post(digits(one, board).ge(digits(other, board))));
  }

  /** Where the later kiln has a firing of some position, so has the earlier. */
  static LikeKilns byFirings() {
    return new LikeKilns(
        BY_FIRINGS,
        "of kilns that are alike, the earlier in the list has no fewer firings",
        (one, other, board, group) ->
            IntStream.range(0, one.size())
                .forEach(
                    i -> group.post(board.isLit(other.get(i)).implies(board.isLit(one.get(i))))));
  }

  private static Term digits(List<Firing> firings, Board board) {
    List<Term> digits = new ArrayList<>();
    int base = 1 + (int) board.heats().count();
    int weight = 1;
    for (int position = Math.min(COMPARED, firings.size()) - 1; position >= 0; position--) {
      digits.add(board.heat(firings.get(position)).times(weight));
      weight *= base;
    }
    return Term.sum(digits);
  }

  @Override
  public String name() {
    return name;
  }

  @Override
  public String summary() {
    return summary;
  }

  @Override
  public String roleLabel() {
    return new Role.Symmetry(List.of()).label();
  }

  @Override
  public Role role(Campaign campaign) {
    return new Role.Symmetry(alike(campaign).stream().map(p -> exchange(p, campaign)).toList());
  }

  @Override
  public void apply(Campaign campaign, Change change) {
    Board board = new Board(campaign, change::variable);
    Group group = change.group("kilns that are alike in the order of the list");
    for (Pair pair : alike(campaign)) {
      order.post(board.firingsOf(pair.one()), board.firingsOf(pair.other()), board, group);
    }
  }

  /** Each kiln with the next that is like it. */
  static List<Pair> alike(Campaign campaign) {
    List<Pair> pairs = new ArrayList<>();
    Map<Kiln, Integer> latest = new HashMap<>();
    for (int kiln = 0; kiln < campaign.kilns().size(); kiln++) {
      Integer before = latest.put(campaign.kilns().get(kiln).named(""), kiln);
      if (before != null) {
        pairs.add(new Pair(before, kiln));
      }
    }
    return pairs;
  }

  private static Permutation exchange(Pair pair, Campaign campaign) {
    Map<String, String> images = new TreeMap<>();
    List<Firing> firings = campaign.firings();
    for (Firing one : firings) {
      for (Firing other : firings) {
        if (pair.isOf(one.kiln(), other.kiln()) && one.position() == other.position()) {
          exchange(one, other, campaign, images);
        }
      }
    }
    return Permutation.of(images);
  }

  private static void exchange(
      Firing one, Firing other, Campaign campaign, Map<String, String> images) {
    images.put(Names.heat(one), Names.heat(other));
    images.put(Names.change(one), Names.change(other));
    images.put(Names.start(one), Names.start(other));
    images.put(Names.end(one), Names.end(other));
    for (Lot lot : campaign.lots()) {
      if (campaign.takes(campaign.kiln(one), lot)) {
        images.put(Names.in(lot, one), Names.in(lot, other));
      }
    }
  }
}
