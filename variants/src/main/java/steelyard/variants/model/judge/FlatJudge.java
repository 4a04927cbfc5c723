package steelyard.variants.model.judge;

import java.util.List;
import java.util.OptionalInt;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import steelyard.variants.model.Comparison;
import steelyard.variants.model.Definition;
import steelyard.variants.model.Domain;
import steelyard.variants.model.Linear;
import steelyard.variants.model.LinearSum;

/**
 * Judges what adapters see instead of what was written: completes definitions by the constraint
 * itself and insists that each leaves exactly one value. For tests of normalising and of
 * decompositions.
 */
public final class FlatJudge {
  private final int[] values;
  private final RelationJudge judge;

  /**
   * A judge that fills in what definitions define.
   *
   * @param values by variable id; those of defined variables are overwritten by {@link #complete}
   */
  public FlatJudge(int[] values) {
    this.values = values;
    this.judge = new RelationJudge(v -> this.values[v]);
  }

  public RelationJudge relations() {
    return judge;
  }

  /**
   * Gives each defined variable its value, in order.
   *
   * @throws IllegalStateException if a definition leaves none or several values of the domain
   */
  public void complete(List<Definition> definitions, IntFunction<Domain> domain) {
    for (Definition definition : definitions) {
      int variable = definition.variable();
      OptionalInt solved = solve(definition);
      int[] fitting =
          solved.isPresent()
              ? IntStream.of(solved.getAsInt()).filter(domain.apply(variable)::contains).toArray()
              : domain.apply(variable).stream().filter(x -> fits(definition, x)).toArray();
      if (fitting.length != 1) {
        throw new IllegalStateException(
            definition + " leaves " + fitting.length + " values of " + domain.apply(variable));
      }
      values[variable] = fitting[0];
    }
  }

  private boolean fits(Definition definition, int value) {
    values[definition.variable()] = value;
    return judge.holds(definition.constraint());
  }

  /** The value by arithmetic, where the definition is an equation: domains of sums are large. */
  private OptionalInt solve(Definition definition) {
    if (!(definition.constraint() instanceof Linear linear) || linear.op() != Comparison.EQ) {
      return OptionalInt.empty();
    }
    LinearSum sum = linear.sum();
    long rest = linear.bound();
    long own = 0;
    for (int i = 0; i < sum.size(); i++) {
      if (sum.variable(i) == definition.variable()) {
        own = sum.coefficient(i);
      } else {
        rest -= sum.coefficient(i) * values[sum.variable(i)];
      }
    }
    return Math.abs(own) == 1 ? OptionalInt.of(Math.toIntExact(rest * own)) : OptionalInt.empty();
  }
}
