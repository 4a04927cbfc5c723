package steelyard.adapters.sat.encoding;

import java.util.List;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Task;

/**
 * A literal for the order of each pair of tasks: Crawford &amp; Baker (1994), "Experimental Results
 * on the Application of Satisfiability Algorithms to Scheduling Problems", AAAI, 1092-1097.
 */
final class NoOverlapEncoder {
  static final String NAME = "order of each pair (Crawford & Baker 1994)";

  private final Cnf cnf;
  private final Integers integers;
  private final LinearEncoder linear;

  NoOverlapEncoder(Cnf cnf, Integers integers, LinearEncoder linear) {
    this.cnf = cnf;
    this.integers = integers;
    this.linear = linear;
  }

  void encode(NoOverlap relation) {
    List<Task> tasks = relation.tasks().asList();
    for (int i = 0; i < tasks.size(); i++) {
      for (int j = i + 1; j < tasks.size(); j++) {
        separate(tasks.get(i), tasks.get(j));
      }
    }
  }

  private void separate(Task a, Task b) {
    int absent = -integers.literal(a.present());
    int otherAbsent = -integers.literal(b.present());
    boolean never = absent == Cnf.TRUE || otherAbsent == Cnf.TRUE;
    if (never || mustPrecede(a, b) || mustPrecede(b, a)) {
      return;
    }
    boolean bothPresent = absent == Cnf.FALSE && otherAbsent == Cnf.FALSE;
    int first = mayPrecede(a, b) ? cnf.variable() : Cnf.FALSE;
    int second = !mayPrecede(b, a) ? Cnf.FALSE : bothPresent ? -first : cnf.variable();
    if (second != -first) {
      cnf.clause(absent, otherAbsent, first, second);
    }
    precede(a, b, first);
    precede(b, a, second);
  }

  private void precede(Task a, Task b, int when) {
    if (when != Cnf.FALSE) {
      linear.order(a.end(), b.start(), when);
    }
  }

  private boolean mayPrecede(Task a, Task b) {
    return integers.min(a.end()) <= integers.max(b.start());
  }

  private boolean mustPrecede(Task a, Task b) {
    return integers.max(a.end()) <= integers.min(b.start());
  }
}
