package steelyard.variants.model;

import java.util.Objects;

/** No two of the views have the same value. */
public record AllDifferent(Views scope) implements Relation {

  public AllDifferent {
    Objects.requireNonNull(scope, "scope");
  }

  public static AllDifferent of(Viewable... scope) {
    return new AllDifferent(Views.of(scope));
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.allDifferent(this);
  }

  @Override
  public AllDifferent rewrite(Rewriting rewriting) {
    Views mapped = scope.mapped(rewriting);
    return new AllDifferent(mapped.permuted(rewriting.rows(mapped.size(), mapped::compareRows)));
  }

  @Override
  public String kind() {
    return "all-different";
  }
}
