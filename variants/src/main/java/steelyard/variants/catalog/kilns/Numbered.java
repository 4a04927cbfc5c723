package steelyard.variants.catalog.kilns;

import java.util.ArrayList;
import java.util.List;
import java.util.function.ToIntFunction;
import java.util.stream.IntStream;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Element;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Longs;
import steelyard.variants.model.View;
import steelyard.variants.model.Viewable;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/** Reformulations over the number of each lot's firing. */
final class Numbered {
  private Numbered() {}

  static String name(Lot lot) {
    return "firing[" + lot.name() + "]";
  }

  private static IntVar firing(int lot, Campaign campaign, Change change) {
    return change.variable(name(campaign.lot(lot)));
  }

  /**
   * A number for each lot, its firing's: the lot is in a firing exactly where the number is that
   * firing's. A number has one value, so that exactly one of the yeses holds; and one that holds
   * gives the number.
   */
  static void firings(Campaign campaign, Change change) {
    change.withdraw(Groups.EACH_LOT_ONCE);
    Board board = new Board(campaign, change::variable);
    Group group = change.group(Groups.EACH_LOT_ONCE);
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      List<Firing> choices = board.choices(lot);
      Domain domain = Domain.of(choices.stream().mapToInt(Firing::index));
      IntVar number = change.integer(name(campaign.lot(lot)), domain);
      for (Firing firing : choices) {
        group.post(board.isIn(lot, firing).iff(number.eq(firing.index())));
      }
    }
  }

  /** One bin packing of the lots into the firings, one of the large lots, instead of the sums. */
  static void binPacking(Campaign campaign, Change change) {
    pack(campaign, change, Groups.SHELVES, "load", campaign.lotNumbers(), Kiln::shelves);
    if (campaign.lots().stream().anyMatch(Lot::large)) {
      IntStream large = campaign.lotNumbers().filter(lot -> campaign.lot(lot).large());
      pack(campaign, change, Groups.WIDE_SHELVES, "wide", large, Kiln::wide);
    }
  }

  private static void pack(
      Campaign campaign,
      Change change,
      String group,
      String load,
      IntStream lots,
      ToIntFunction<Kiln> room) {
    change.withdraw(group);
    List<Viewable> loads = new ArrayList<>();
    for (Firing firing : campaign.firings()) {
      String name = load + "[" + firing.name() + "]";
      loads.add(change.integer(name, 0, room.applyAsInt(campaign.kiln(firing))));
    }
    int[] items = lots.toArray();
    Views bins = Views.of(IntStream.of(items).mapToObj(l -> firing(l, campaign, change)).toList());
    long[] sizes = IntStream.of(items).mapToLong(l -> campaign.lot(l).shelves()).toArray();
    change.group(group).post(new BinPacking(bins, Longs.of(sizes), Views.of(loads)));
  }

  /** A lot's heat is its firing's, looked up by the number, and one at which the lot matures. */
  static void heatElement(Campaign campaign, Change change) {
    change.withdraw(Groups.AT_ITS_HEAT);
    Board board = new Board(campaign, change::variable);
    Views heats = Views.of(board.firings().stream().map(board::heat).toList());
    for (int l = 0; l < campaign.lots().size(); l++) {
      Lot lot = campaign.lot(l);
      View own =
          lot.coolest() == lot.hottest()
              ? View.constant(lot.coolest())
              : change.integer("heatof[" + lot.name() + "]", lot.coolest(), lot.hottest()).view();
      View number = firing(l, campaign, change).view();
      change.group(Groups.AT_ITS_HEAT).post(new Element(heats, number, own));
    }
  }

  /** The day on which a lot is out is its firing's, looked up by the number. */
  static void outElement(Campaign campaign, Change change) {
    change.withdraw(Groups.OUT);
    Board board = new Board(campaign, change::variable);
    Views ends = Views.of(board.firings().stream().map(board::end).toList());
    for (int lot = 0; lot < campaign.lots().size(); lot++) {
      View number = firing(lot, campaign, change).view();
      change.group(Groups.OUT).post(new Element(ends, number, board.out(lot).view()));
    }
  }
}
