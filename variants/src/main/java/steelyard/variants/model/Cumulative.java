package steelyard.variants.model;

import java.util.Objects;

/**
 * At every time t the demands of the present tasks with {@code start <= t < end} sum to at most the
 * capacity. Where no task runs, nothing is said of the capacity.
 *
 * @param demands one per task, at least 0 in every domain value
 */
public record Cumulative(Tasks tasks, Views demands, View capacity) implements Relation {

  public Cumulative {
    Objects.requireNonNull(tasks, "tasks");
    Objects.requireNonNull(demands, "demands");
    Objects.requireNonNull(capacity, "capacity");
    if (demands.size() != tasks.size()) {
      throw new IllegalArgumentException(
          tasks.size() + " tasks with " + demands.size() + " demands");
    }
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.cumulative(this);
  }

  @Override
  public Cumulative rewrite(Rewriting rewriting) {
    Tasks mapped = tasks.mapped(rewriting);
    Views amounts = demands.mapped(rewriting);
    int[] order =
        rewriting.rows(
            mapped.size(),
            (i, j) -> {
              int byTask = mapped.compareRows(i, j);
              return byTask != 0 ? byTask : amounts.compareRows(i, j);
            });
    return new Cumulative(
        mapped.permuted(order), amounts.permuted(order), capacity.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "cumulative";
  }
}
