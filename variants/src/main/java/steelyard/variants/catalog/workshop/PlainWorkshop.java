package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.Term;
import steelyard.variants.model.build.Draft;
import steelyard.variants.model.build.Group;

/**
 * The plain model: a start for each operation, and of any two visits to a station one ends before
 * the other starts. The domains leave out plans longer than the greedy one; the shortest plan is
 * not among those.
 */
final class PlainWorkshop {
  private PlainWorkshop() {}

  static void write(Workshop workshop, Draft draft) {
    Starts starts = starts(workshop, draft);
    Group inOrder = draft.group(Names.IN_ORDER);
    List<Term> ends = new ArrayList<>();
    for (int m = 0; m < workshop.moulds().size(); m++) {
      int last = workshop.mould(m).lastStep();
      for (int step = 0; step < last; step++) {
        inOrder.post(starts.end(m, step).le(starts.of(m, step + 1)));
      }
      ends.add(starts.end(m, last));
    }
    Group oneAtATime = draft.group(Names.ONE_AT_A_TIME);
    for (Pair pair : Pair.all(workshop)) {
      oneAtATime.post(
          starts.before(pair.one(), pair.other()).or(starts.before(pair.other(), pair.one())));
    }
    draft.minimize(draft.define(Names.MAKESPAN, Term.max(ends)));
  }

  private static Starts starts(Workshop workshop, Draft draft) {
    int horizon = GreedyPlan.of(workshop).makespan();
    Map<String, IntVar> starts = new HashMap<>();
    for (int m = 0; m < workshop.moulds().size(); m++) {
      Mould mould = workshop.mould(m);
      for (int step = 0; step <= mould.lastStep(); step++) {
        String name = Names.start(m, step);
        int latest = horizon - mould.tail(step) - mould.minutes(step);
        starts.put(name, draft.integer(name, mould.head(step), latest));
      }
    }
    return new Starts(workshop, starts::get);
  }
}
