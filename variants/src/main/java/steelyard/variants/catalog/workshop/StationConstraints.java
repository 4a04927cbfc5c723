package steelyard.variants.catalog.workshop;

import java.util.Collections;
import java.util.List;
import java.util.function.Function;
import java.util.stream.IntStream;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Relation;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.View;
import steelyard.variants.model.Views;
import steelyard.variants.model.build.Change;
import steelyard.variants.model.build.Group;

/**
 * Reformulations: one global constraint for each station instead of its pairs. Visits are of
 * positive length, and for two such tasks neither overlapping nor running at the same time means
 * that one ends before the other starts, which is what the pair says; two visits of one mould are
 * apart already by its route.
 */
final class StationConstraints {
  private StationConstraints() {}

  static void noOverlap(Workshop workshop, Change change) {
    replacePairs(workshop, change, NoOverlap::new);
  }

  static void cumulative(Workshop workshop, Change change) {
    View one = View.constant(1);
    replacePairs(
        workshop,
        change,
        tasks -> new Cumulative(tasks, Views.of(Collections.nCopies(tasks.size(), one)), one));
  }

  private static void replacePairs(
      Workshop workshop, Change change, Function<Tasks, Relation> constraint) {
    if (Pair.all(workshop).isEmpty()) {
      return;
    }
    change.withdraw(Names.ONE_AT_A_TIME);
    Starts starts = new Starts(workshop, change::variable);
    Group group = change.group(Names.ONE_AT_A_TIME);
    IntStream.range(0, workshop.stations())
        .mapToObj(workshop::visits)
        .filter(visits -> visits.size() > 1)
        .forEach(visits -> group.post(constraint.apply(tasks(visits, starts))));
  }

  private static Tasks tasks(List<Visit> visits, Starts starts) {
    return Tasks.of(visits.stream().map(v -> Task.fixed(starts.of(v), v.minutes())).toList());
  }
}
