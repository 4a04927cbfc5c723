package steelyard.variants.catalog.kilns;

import java.util.SortedMap;
import java.util.TreeMap;
import java.util.stream.IntStream;
import steelyard.variants.model.Ints;

/**
 * A firing plan: what is decided of a campaign.
 *
 * @param firingOf by lot, the index of its firing
 * @param heats by firing, 0 where it is not lit
 * @param starts by firing, the day on which it is lit; 0 where it is not
 */
record Plan(Ints firingOf, Ints heats, Ints starts) {

  boolean isLit(Firing firing) {
    return heats.get(firing.index()) > 0;
  }

  int heat(Firing firing) {
    return heats.get(firing.index());
  }

  int start(Firing firing) {
    return starts.get(firing.index());
  }

  /** The day on which the kiln is opened. */
  int end(Firing firing, Campaign campaign) {
    return isLit(firing) ? start(firing) + campaign.heat(heat(firing)).days() : start(firing);
  }

  /** The lots of a firing. */
  IntStream lotsIn(Firing firing) {
    return IntStream.range(0, firingOf.size()).filter(lot -> firingOf.get(lot) == firing.index());
  }

  /** The values of the plain model's decisions, by name. */
  SortedMap<String, Integer> decisions(Campaign campaign) {
    SortedMap<String, Integer> values = new TreeMap<>();
    int heat = 0;
    int free = 0;
    for (Firing firing : campaign.firings()) {
      Kiln kiln = campaign.kiln(firing);
      if (firing.isFirst()) {
        heat = kiln.set();
        free = 0;
      }
      boolean isLit = isLit(firing);
      values.put(Names.heat(firing), heat(firing));
      values.put(Names.change(firing), isLit ? campaign.change(kiln, heat, heat(firing)) : 0);
      values.put(Names.start(firing), isLit ? start(firing) : free);
      free = isLit ? end(firing, campaign) : free;
      heat = isLit ? heat(firing) : heat;
      values.put(Names.end(firing), free);
      for (int lot = 0; lot < campaign.lots().size(); lot++) {
        if (campaign.takes(kiln, campaign.lot(lot))) {
          boolean isIn = firingOf.get(lot) == firing.index();
          values.put(Names.in(campaign.lot(lot), firing), isIn ? 1 : 0);
          if (isIn) {
            values.put(Names.out(campaign.lot(lot)), free);
          }
        }
      }
    }
    return values;
  }
}
