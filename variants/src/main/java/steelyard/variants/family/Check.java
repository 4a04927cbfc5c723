package steelyard.variants.family;

import java.util.List;
import java.util.Objects;
import java.util.OptionalLong;

/**
 * What a family's checker found.
 *
 * @param problems empty if the answer is right; each in one line in the family's own words
 * @param objective recomputed from the answer's decisions; empty without an objective or where the
 *     problems leave none
 */
public record Check(List<String> problems, OptionalLong objective) {
  public Check {
    problems = List.copyOf(problems);
    Objects.requireNonNull(objective, "objective");
  }

  public boolean isRight() {
    return problems.isEmpty();
  }
}
