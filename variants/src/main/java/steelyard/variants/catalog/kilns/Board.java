package steelyard.variants.catalog.kilns;

import java.util.List;
import java.util.function.Function;
import java.util.function.IntUnaryOperator;
import java.util.stream.IntStream;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;

/** The plain model's variables of a campaign, and what is said with them. */
final class Board {
  private final Campaign campaign;
  private final Function<String, IntVar> byName;
  private final List<Firing> firings;

  Board(Campaign campaign, Function<String, IntVar> byName) {
    this.campaign = campaign;
    this.byName = byName;
    this.firings = campaign.firings();
  }

  List<Firing> firings() {
    return firings;
  }

  List<Firing> firingsOf(int kiln) {
    return firings.stream().filter(firing -> firing.kiln() == kiln).toList();
  }

  /** The firings of the kilns that can take the lot. */
  List<Firing> choices(int lot) {
    return firings.stream().filter(firing -> offers(firing, lot)).toList();
  }

  /** Whether the firing's kiln can take the lot. */
  boolean offers(Firing firing, int lot) {
    return campaign.takes(campaign.kiln(firing), campaign.lot(lot));
  }

  /** The lots that the firing's kiln can take. */
  IntStream lotsFor(Firing firing) {
    return campaign.lotNumbers().filter(lot -> offers(firing, lot));
  }

  /** The firing before, in the same kiln. */
  Firing before(Firing firing) {
    return firings.get(firing.index() - 1);
  }

  /** 1 where the lot is in the firing; only for a firing that {@link #offers} it. */
  IntVar in(int lot, Firing firing) {
    return byName.apply(Names.in(campaign.lot(lot), firing));
  }

  IntVar heat(Firing firing) {
    return byName.apply(Names.heat(firing));
  }

  IntVar start(Firing firing) {
    return byName.apply(Names.start(firing));
  }

  /** The day on which the kiln is opened. */
  IntVar end(Firing firing) {
    return byName.apply(Names.end(firing));
  }

  IntVar change(Firing firing) {
    return byName.apply(Names.change(firing));
  }

  /** 1 where the firing has that heat. */
  IntVar lit(Firing firing, int heat) {
    return byName.apply(Names.lit(firing, heat));
  }

  IntVar out(int lot) {
    return byName.apply(Names.out(campaign.lot(lot)));
  }

  IntVar late(int lot) {
    return byName.apply(Names.late(campaign.lot(lot)));
  }

  Formula isIn(int lot, Firing firing) {
    return isTrue(in(lot, firing));
  }

  /** The one lot is not in its firing or the other is not in its. */
  Clause notBoth(int one, Firing oneFiring, int other, Firing otherFiring) {
    return Clause.of(in(one, oneFiring).view().atMost(0), in(other, otherFiring).view().atMost(0));
  }

  Formula isLit(Firing firing) {
    return heat(firing).ge(1);
  }

  static Formula isTrue(IntVar truth) {
    return Formula.literal(truth.view().atLeast(1));
  }

  /** Σ of the shelves of those of {@code lots} that are in the firing. */
  Term shelvesOf(IntStream lots, Firing firing) {
    return Term.sum(
        lots.mapToObj(lot -> in(lot, firing).times(campaign.lot(lot).shelves())).toList());
  }

  /** Σ of {@code weight} over the heats that the firing can have: that of the one it has. */
  Term byHeat(Firing firing, IntStream heats, IntUnaryOperator weight) {
    return Term.sum(
        heats
            .filter(heat -> heat <= campaign.kiln(firing).hottest())
            .mapToObj(heat -> lit(firing, heat).times(weight.applyAsInt(heat)))
            .toList());
  }

  /** Every heat. */
  IntStream heats() {
    return IntStream.rangeClosed(1, campaign.heats().size());
  }
}
