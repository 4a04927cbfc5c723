package steelyard.adapters.sat.encoding;

import java.util.NavigableSet;
import java.util.TreeSet;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Task;
import steelyard.variants.model.View;

/**
 * At each time at which a task may start, the demands of the tasks that run fit: the time
 * decomposition of Schutt, Feydy, Stuckey &amp; Wallace (2009), "Why Cumulative Decomposition Is
 * Not as Bad as It Sounds", CP, LNCS 5732:746-761, section 3, over constant demands and a capacity
 * that is not negative.
 */
final class CumulativeEncoder {
  static final String NAME = "time decomposition (Schutt et al. 2009)";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  CumulativeEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  /** Whether this encodes the relation, and in fewer clauses than the task decomposition would. */
  boolean suits(Cumulative relation) {
    boolean takes =
        relation.demands().stream().allMatch(View::isConstant)
            && integers.min(relation.capacity()) >= 0;
    if (!takes) {
      return false;
    }
    double tasks = relation.tasks().size();
    double starts = relation.tasks().starts().stream().mapToDouble(this::values).sum();
    double total = relation.demands().stream().mapToDouble(View::offset).sum();
    double weighing = 2 * tasks * Math.min(total, integers.max(relation.capacity()) + 1.0);
    double byTime = times(relation).size() * (tasks + weighing);
    double byTask = tasks * (4 * starts + weighing);
    return byTime <= byTask;
  }

  private double values(View view) {
    return view.isConstant() ? 1 : integers.size(view.variable());
  }

  void encode(Cumulative relation) {
    times(relation).forEach(time -> fit(relation, time));
  }

  private NavigableSet<Integer> times(Cumulative relation) {
    NavigableSet<Integer> times = new TreeSet<>();
    relation.tasks().starts().stream().forEach(s -> integers.forEachValue(s, times::add));
    return times;
  }

  private void fit(Cumulative relation, int time) {
    LinearEncoder.Sum sum = linear.sum().add(relation.capacity(), -1);
    for (int i = 0; i < relation.tasks().size(); i++) {
      int demand = relation.demands().offset(i);
      if (demand > 0) {
        sum.addWhere(runs(relation.tasks().get(i), time), demand);
      }
    }
    linear.encode(sum, Comparison.LE, 0, Cnf.TRUE);
  }

  /** A literal that is true at least where the task runs at {@code time}. */
  private int runs(Task task, int time) {
    int started = integers.atMost(task.start(), time);
    int open = integers.atLeast(task.end(), time + 1L);
    int present = integers.literal(task.present());
    Literals undecided = new Literals(3);
    for (int literal : new int[] {started, open, present}) {
      if (literal == Cnf.FALSE) {
        return Cnf.FALSE;
      }
      if (literal != Cnf.TRUE) {
        undecided.add(literal);
      }
    }
    if (undecided.size() <= 1) {
      return undecided.isEmpty() ? Cnf.TRUE : undecided.get(0);
    }
    int runs = cnf.variable();
    cnf.or(runs).orAny(undecided.negated()).end();
    return runs;
  }
}
