package steelyard.variants.catalog.workshop;

import java.util.List;
import steelyard.variants.model.Formula;
import steelyard.variants.model.IntVar;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Implied constraints on who comes before whom.
 *
 * @see <a href="https://doi.org/10.1287/opre.8.2.219">Manne (1960), "On the job-shop scheduling
 *     problem", Operations Research 8(2):219-223</a>, for the variables
 */
final class Orders {
  private Orders() {}

  static String name(Visit one, Visit other) {
    return "before[" + label(one) + "," + label(other) + "]";
  }

  private static String label(Visit visit) {
    return visit.mould() + "." + visit.step();
  }

  /** Where the one does not end before the other starts, the pair leaves only the converse. */
  static void named(Workshop workshop, Change change) {
    Starts starts = new Starts(workshop, change::variable);
    Group group = change.group("one before the other");
    for (Pair pair : Pair.all(workshop)) {
      IntVar before =
          change.define(name(pair.one(), pair.other()), starts.before(pair.one(), pair.other()));
      group.post(isTrue(before).or(starts.before(pair.other(), pair.one())));
    }
  }

  /**
   * Of three visits to a station, none comes before the next all the way round: time would have to
   * run in a circle. Each of the two ways round is ruled out by one clause.
   */
  static void transitive(Workshop workshop, Change change) {
    Group group = change.group("no circles");
    for (int station = 0; station < workshop.stations(); station++) {
      List<Visit> visits = workshop.visits(station);
      for (int i = 0; i < visits.size(); i++) {
        for (int j = i + 1; j < visits.size(); j++) {
          for (int k = j + 1; k < visits.size(); k++) {
            noCircle(visits.get(i), visits.get(j), visits.get(k), change, group);
          }
        }
      }
    }
  }

  private static void noCircle(Visit a, Visit b, Visit c, Change change, Group group) {
    if (a.mould() == b.mould() || b.mould() == c.mould()) {
      return;
    }
    Formula ab = isTrue(change.variable(name(a, b)));
    Formula bc = isTrue(change.variable(name(b, c)));
    Formula ac = isTrue(change.variable(name(a, c)));
    group.post(Formula.any(ab.not(), bc.not(), ac));
    group.post(Formula.any(ab, bc, ac.not()));
  }

  private static Formula isTrue(IntVar truth) {
    return Formula.literal(truth.view().atLeast(1));
  }
}
