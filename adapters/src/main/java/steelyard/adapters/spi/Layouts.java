package steelyard.adapters.spi;

import java.util.List;
import steelyard.variants.model.Atom;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.NoOverlap2D;
import steelyard.variants.model.Task;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.View;

/** Decompositions of what lies beside each other in time and space. */
final class Layouts {
  private final Definer definer;
  private final Conditions conditions;

  Layouts(Definer definer, Conditions conditions) {
    this.definer = definer;
    this.conditions = conditions;
  }

  /**
   * One disjunction for each pair of tasks: Balas (1969), "Machine Sequencing via Disjunctive
   * Graphs", Operations Research 17(6):941-957.
   */
  String noOverlap(NoOverlap relation) {
    List<Task> tasks = relation.tasks().asList();
    for (int i = 0; i < tasks.size(); i++) {
      for (int j = i + 1; j < tasks.size(); j++) {
        Task a = tasks.get(i);
        Task b = tasks.get(j);
        if (definer.mayBe(a.present()) && definer.mayBe(b.present())) {
          conditions.require(
              b.end(),
              Comparison.LE,
              a.start(),
              a.present().negated(),
              b.present().negated(),
              definer.compare(a.end(), Comparison.LE, b.start()));
        }
      }
    }
    return "disjunction per pair (Balas 1969)";
  }

  /**
   * One disjunction of the four sides for each pair of boxes: Moffitt &amp; Pollack (2006),
   * "Optimal Rectangle Packing: A Meta-CSP Approach", ICAPS, 93-102.
   */
  String noOverlap2D(NoOverlap2D relation) {
    List<Task> across = relation.across().asList();
    List<Task> up = relation.up().asList();
    for (int i = 0; i < across.size(); i++) {
      for (int j = i + 1; j < across.size(); j++) {
        apart(across.get(i), up.get(i), across.get(j), up.get(j));
      }
    }
    return "disjunction of four sides per pair (Moffitt & Pollack 2006)";
  }

  private void apart(Task x1, Task y1, Task x2, Task y2) {
    List<Atom> presences = List.of(x1.present(), y1.present(), x2.present(), y2.present());
    if (presences.stream().allMatch(definer::mayBe)) {
      conditions.require(
          y2.end(),
          Comparison.LE,
          y1.start(),
          definer.all(presences).negated(),
          definer.compare(x1.end(), Comparison.LE, x2.start()),
          definer.compare(x2.end(), Comparison.LE, x1.start()),
          definer.compare(y1.end(), Comparison.LE, y2.start()));
    }
  }

  /**
   * Demands are not negative, so their sum is largest at the start of some task that runs: there it
   * must fit. The task decomposition of Schutt, Feydy, Stuckey &amp; Wallace (2009), "Why
   * Cumulative Decomposition Is Not as Bad as It Sounds", CP, LNCS 5732:746-761, section 3.
   */
  String cumulative(Cumulative relation) {
    for (int at = 0; at < relation.tasks().size(); at++) {
      Task task = relation.tasks().get(at);
      conditions.require(
          loadAtStartOf(at, relation).toLinearSum(),
          Comparison.LE,
          0,
          task.present().negated(),
          definer.compare(task.end(), Comparison.LE, task.start()));
    }
    return "task decomposition (Schutt et al. 2009)";
  }

  /** The demands of task {@code at} and of those that run at its start, less the capacity. */
  private Sum loadAtStartOf(int at, Cumulative relation) {
    Tasks tasks = relation.tasks();
    View time = tasks.starts().get(at);
    Sum sum = new Sum().add(1, relation.demands().get(at)).add(-1, relation.capacity());
    for (int i = 0; i < tasks.size(); i++) {
      if (i != at) {
        definer.addWhere(runs(tasks.get(i), time), 1, relation.demands().get(i), sum);
      }
    }
    return sum;
  }

  private Atom runs(Task task, View time) {
    return definer.all(
        List.of(
            task.present(),
            definer.compare(task.start(), Comparison.LE, time),
            definer.compare(task.end(), Comparison.LE, time).negated()));
  }
}
