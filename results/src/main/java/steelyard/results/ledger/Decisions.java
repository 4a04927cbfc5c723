package steelyard.results.ledger;

import com.fasterxml.jackson.annotation.JsonCreator;
import com.fasterxml.jackson.annotation.JsonValue;
import java.util.Arrays;

/** The values of a model's decision variables, in the model's order. Immutable; value equality. */
public final class Decisions {

  private final int[] values;

  private Decisions(int[] values) {
    this.values = values;
  }

  /** These values; the array is copied. */
  @JsonCreator
  public static Decisions of(int... values) {
    return new Decisions(Text.require("decisions", values).clone());
  }

  /** How many decision variables there are. */
  public int size() {
    return values.length;
  }

  /** The value of a variable, counted from 0. */
  public int get(int variable) {
    return values[variable];
  }

  /** All values, in a new array. */
  @JsonValue
  public int[] toArray() {
    return values.clone();
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Decisions that && Arrays.equals(values, that.values);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(values);
  }

  @Override
  public String toString() {
    return Arrays.toString(values);
  }
}
