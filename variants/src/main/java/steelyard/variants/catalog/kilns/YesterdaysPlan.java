package steelyard.variants.catalog.kilns;

import java.util.HashMap;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;
import steelyard.variants.family.Answer;

/**
 * What is left of an earlier plan: of each kiln, the firings that are not lit before today, from
 * the first position on, as many days sooner as have passed.
 */
final class YesterdaysPlan {
  private final Campaign before;
  private final Answer plan;
  private final Campaign now;
  private final SortedMap<String, Integer> hint = new TreeMap<>();

  private YesterdaysPlan(Campaign before, Answer plan, Campaign now) {
    this.before = before;
    this.plan = plan;
    this.now = now;
  }

  /** The heats, starts and lots of what is left; lots and kilns are known by their names. */
  static SortedMap<String, Integer> hint(Campaign before, Answer plan, Campaign now) {
    YesterdaysPlan it = new YesterdaysPlan(before, plan, now);
    Map<String, Integer> next = new HashMap<>();
    for (Firing firing : before.firings()) {
      if (it.isLeft(firing)) {
        String kiln = before.kiln(firing).name();
        int position = next.merge(kiln, 1, Integer::sum) - 1;
        now.firings().stream()
            .filter(f -> f.position() == position && now.kiln(f).name().equals(kiln))
            .forEach(today -> it.carry(firing, today));
      }
    }
    return it.hint;
  }

  private boolean isLeft(Firing firing) {
    return plan.value(Names.heat(firing)) > 0 && startToday(firing) >= 0;
  }

  private int startToday(Firing firing) {
    return plan.value(Names.start(firing)) + before.works().day() - now.works().day();
  }

  private void carry(Firing firing, Firing today) {
    int heat = plan.value(Names.heat(firing));
    if (heat <= now.kiln(today).hottest() && startToday(firing) <= now.works().days()) {
      hint.put(Names.heat(today), heat);
      hint.put(Names.start(today), startToday(firing));
    }
    for (Lot lot : now.lots()) {
      boolean isIn = plan.values().getOrDefault(Names.in(lot, firing), 0) == 1;
      if (isIn && now.takes(now.kiln(today), lot)) {
        hint.put(Names.in(lot, today), 1);
      }
    }
  }
}
