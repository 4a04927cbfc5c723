package steelyard.variants.model.judge;

import java.util.HashSet;
import java.util.Set;
import java.util.stream.IntStream;
import steelyard.variants.model.AllDifferent;
import steelyard.variants.model.Assignment;
import steelyard.variants.model.Atoms;
import steelyard.variants.model.BinPacking;
import steelyard.variants.model.Clause;
import steelyard.variants.model.Conditional;
import steelyard.variants.model.Constraint;
import steelyard.variants.model.Cumulative;
import steelyard.variants.model.Element;
import steelyard.variants.model.Linear;
import steelyard.variants.model.Maximum;
import steelyard.variants.model.NoOverlap;
import steelyard.variants.model.Relation;
import steelyard.variants.model.RelationVisitor;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tasks;
import steelyard.variants.model.Tuples;

/** Whether a relation holds of an assignment, by the words of its definition. */
public final class RelationJudge implements RelationVisitor<Boolean> {
  private final Assignment values;

  /**
   * A judge of one assignment.
   *
   * @param values of every variable that a judged constraint mentions
   */
  public RelationJudge(Assignment values) {
    this.values = values;
  }

  public boolean holds(Constraint constraint) {
    if (constraint instanceof Conditional conditional) {
      return conditional
          .mode()
          .holds(values.holds(conditional.when()), conditional.then().accept(this));
    }
    return ((Relation) constraint).accept(this);
  }

  @Override
  public Boolean linear(Linear relation) {
    return relation.op().holds(relation.sum().value(values), relation.bound());
  }

  @Override
  public Boolean clause(Clause relation) {
    return relation.atoms().stream().anyMatch(values::holds);
  }

  @Override
  public Boolean allDifferent(AllDifferent relation) {
    Set<Integer> seen = new HashSet<>();
    return IntStream.range(0, relation.scope().size())
        .allMatch(i -> seen.add(values.value(relation.scope(), i)));
  }

  @Override
  public Boolean element(Element relation) {
    int index = values.value(relation.index());
    return index >= 0
        && index < relation.array().size()
        && values.value(relation.array(), index) == values.value(relation.result());
  }

  @Override
  public Boolean table(Table relation) {
    boolean found =
        IntStream.range(0, relation.rows().size()).anyMatch(row -> matches(relation, row));
    return found == (relation.polarity() == Table.Polarity.ALLOWED);
  }

  private boolean matches(Table table, int row) {
    Tuples rows = table.rows();
    return IntStream.range(0, rows.arity())
        .allMatch(
            c ->
                rows.get(row, c) == Tuples.ANY
                    || rows.get(row, c) == values.value(table.scope(), c));
  }

  @Override
  public Boolean maximum(Maximum relation) {
    int largest =
        IntStream.range(0, relation.terms().size())
            .map(i -> values.value(relation.terms(), i))
            .max()
            .orElseThrow();
    return largest == values.value(relation.result());
  }

  @Override
  public Boolean noOverlap(NoOverlap relation) {
    Tasks tasks = relation.tasks();
    int[] present = present(tasks.presences());
    for (int a = 0; a < present.length; a++) {
      for (int b = a + 1; b < present.length; b++) {
        int i = present[a];
        int j = present[b];
        if (values.value(tasks.ends(), i) > values.value(tasks.starts(), j)
            && values.value(tasks.ends(), j) > values.value(tasks.starts(), i)) {
          return false;
        }
      }
    }
    return true;
  }

  @Override
  public Boolean cumulative(Cumulative relation) {
    int[] present = present(relation.tasks().presences());
    int capacity = values.value(relation.capacity());
    // The load only rises where a task starts.
    for (int i : present) {
      int time = values.value(relation.tasks().starts(), i);
      if (isRunning(relation, i, time) && load(relation, present, time) > capacity) {
        return false;
      }
    }
    return true;
  }

  private long load(Cumulative relation, int[] present, int time) {
    long load = 0;
    for (int i : present) {
      load += isRunning(relation, i, time) ? values.value(relation.demands(), i) : 0;
    }
    return load;
  }

  private boolean isRunning(Cumulative relation, int i, int time) {
    return values.value(relation.tasks().starts(), i) <= time
        && time < values.value(relation.tasks().ends(), i);
  }

  private int[] present(Atoms presences) {
    return IntStream.range(0, presences.size())
        .filter(i -> values.holds(presences.get(i)))
        .toArray();
  }

  @Override
  public Boolean binPacking(BinPacking relation) {
    long[] loads = new long[relation.loads().size()];
    for (int item = 0; item < relation.bins().size(); item++) {
      int bin = values.value(relation.bins(), item);
      if (bin < 0 || bin >= loads.length) {
        return false;
      }
      loads[bin] += relation.sizes().get(item);
    }
    return IntStream.range(0, loads.length)
        .allMatch(b -> loads[b] == values.value(relation.loads(), b));
  }
}
