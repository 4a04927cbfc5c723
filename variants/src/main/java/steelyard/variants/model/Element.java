package steelyard.variants.model;

import java.util.Objects;

/** {@code array[index] = result}, counted from 0; false where the index is outside the array. */
public record Element(Views array, View index, View result) implements Relation {

  public Element {
    Objects.requireNonNull(array, "array");
    Objects.requireNonNull(index, "index");
    Objects.requireNonNull(result, "result");
  }

  /** Whether every entry is a constant. */
  public boolean isConstantArray() {
    for (int i = 0; i < array.size(); i++) {
      if (!array.isConstant(i)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.element(this);
  }

  @Override
  public Element rewrite(Rewriting rewriting) {
    return new Element(array.mapped(rewriting), index.mapped(rewriting), result.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "element";
  }
}
