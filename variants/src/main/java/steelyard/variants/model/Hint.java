package steelyard.variants.model;

import java.util.Objects;

/** A partial assignment to try first, such as yesterday's plan. */
public record Hint(Ints variables, Ints values) {
  public static final Hint NONE = new Hint(Ints.of(), Ints.of());

  public Hint {
    Objects.requireNonNull(variables, "variables");
    Objects.requireNonNull(values, "values");
    if (variables.size() != values.size()) {
      throw new IllegalArgumentException(
          variables.size() + " variables with " + values.size() + " values");
    }
    if (variables.stream().distinct().count() != variables.size()) {
      throw new IllegalArgumentException("a variable is hinted twice: " + variables);
    }
  }

  public int size() {
    return variables.size();
  }

  Hint rewrite(Rewriting rewriting) {
    return new Hint(variables.mapped(rewriting), values);
  }
}
