package steelyard.adapters.cpsat;

import com.google.ortools.sat.ConstraintProto;
import com.google.ortools.sat.CumulativeConstraintProto;
import com.google.ortools.sat.IntervalConstraintProto;
import com.google.ortools.sat.NoOverlapConstraintProto;
import java.util.HashMap;
import java.util.Map;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Task;

/**
 * Tasks as the library's intervals, one each, and what is said of them. An interval states start +
 * duration = end where it is present, as the task's own posting does everywhere.
 */
final class Intervals {
  private final ModelProto proto;
  private final Places places;
  private final Literals literals;
  private final Map<Task, Integer> made = new HashMap<>();

  Intervals(ModelProto proto, Places places, Literals literals) {
    this.proto = proto;
    this.places = places;
    this.literals = literals;
  }

  boolean mayBePresent(Task task) {
    return !literals.canonical(task.present()).equals(Atom.FALSE);
  }

  private int of(Task task) {
    Integer known = made.get(task);
    if (known == null) {
      known = make(task);
      made.put(task, known);
    }
    return known;
  }

  private int make(Task task) {
    Atom present = literals.canonical(task.present());
    IntervalConstraintProto.Builder interval =
        IntervalConstraintProto.newBuilder()
            .setStart(places.expression(task.start()))
            .setSize(places.expression(task.duration()))
            .setEnd(places.expression(task.end()));
    ConstraintProto.Builder constraint = ConstraintProto.newBuilder().setInterval(interval);
    return present.isConstant()
        ? proto.post(constraint, 3)
        : proto.post(constraint, 3, literals.of(present));
  }

  void noOverlap(NoOverlap relation, int... enforcement) {
    NoOverlapConstraintProto.Builder disjoint = NoOverlapConstraintProto.newBuilder();
    relation.tasks().asList().stream()
        .filter(this::mayBePresent)
        .forEach(task -> disjoint.addIntervals(of(task)));
    proto.post(
        ConstraintProto.newBuilder().setNoOverlap(disjoint),
        disjoint.getIntervalsCount(),
        enforcement);
  }

  void cumulative(Cumulative relation, int... enforcement) {
    CumulativeConstraintProto.Builder resource =
        CumulativeConstraintProto.newBuilder().setCapacity(places.expression(relation.capacity()));
    for (int i = 0; i < relation.tasks().size(); i++) {
      Task task = relation.tasks().get(i);
      if (mayBePresent(task)) {
        resource.addIntervals(of(task));
        resource.addDemands(places.expression(relation.demands().get(i)));
      }
    }
    proto.post(
        ConstraintProto.newBuilder().setCumulative(resource),
        2 * resource.getIntervalsCount() + 1,
        enforcement);
  }
}
