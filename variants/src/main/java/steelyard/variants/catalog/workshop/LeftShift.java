package steelyard.variants.catalog.workshop;

import java.util.ArrayList;
import java.util.List;
import steelyard.variants.model.Formula;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Dominance: an operation starts when the one before it on the route ends, or when another visit to
 * its station does. Of the shortest plans take one with the smallest sum of starts: an operation
 * that waited for neither could start a minute earlier, the plan would be no longer and the sum
 * smaller. Exchanging twins keeps the sum, so that the twins' order can be had beside this. (Such
 * plans are called semi-active; Sprecher, Kolisch and Drexl, 1995, EJOR 80(1):94-102.)
 */
final class LeftShift {
  private LeftShift() {}

  static void post(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    Group group = change.group("no waiting for nothing");
    for (int m = 0; m < workshop.moulds().size(); m++) {
      for (int step = 0; step <= workshop.mould(m).lastStep(); step++) {
        group.post(Formula.any(reasons(workshop, starts, m, step)));
      }
    }
  }

  private static List<Formula> reasons(Workshop workshop, Starts starts, int mould, int step) {
    List<Formula> reasons = new ArrayList<>();
    reasons.add(
        step == 0
            ? starts.of(mould, 0).eq(0)
            : starts.of(mould, step).eq(starts.end(mould, step - 1)));
    Operation operation = workshop.mould(mould).route().get(step);
    if (operation.minutes() > 0) {
      workshop.visits(operation.station()).stream()
          .filter(visit -> visit.mould() != mould)
          .forEach(visit -> reasons.add(starts.of(mould, step).eq(starts.end(visit))));
    }
    return reasons;
  }
}
