package steelyard.variants.model;

import java.util.Objects;

/**
 * Of any two present tasks, one ends no later than the other starts: {@code end[i] <= start[j]} or
 * {@code end[j] <= start[i]}. A task of duration 0 may not lie strictly inside another.
 */
public record NoOverlap(Tasks tasks) implements Relation {

  public NoOverlap {
    Objects.requireNonNull(tasks, "tasks");
  }

  public static NoOverlap of(Task... tasks) {
    return new NoOverlap(Tasks.of(tasks));
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.noOverlap(this);
  }

  @Override
  public NoOverlap rewrite(Rewriting rewriting) {
    Tasks mapped = tasks.mapped(rewriting);
    return new NoOverlap(mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)));
  }

  @Override
  public String kind() {
    return "no-overlap";
  }
}
