package steelyard.variants.model;

import java.util.Objects;
import java.util.function.IntBinaryOperator;

/**
 * What is taken weighs at most {@code capacity} and brings at least {@code profit}: {@code Σ
 * weights[i]·amounts[i] <= capacity} and {@code Σ profits[i]·amounts[i] >= profit}. Fahle &amp;
 * Sellmann (2002), "Cost Based Filtering for the Constrained Knapsack Problem", Annals of
 * Operations Research 115:73-93. Of no items, both sums are 0; nothing is said of signs.
 *
 * <pre>{@code
 * // Crates on a truck: 900 and 400 kg, worth 70 and 45.
 * draft.group("load").post(new Knapsack(
 *     Views.of(large, small), Longs.of(900, 400), View.constant(3500),
 *     Longs.of(70, 45), worth.view()));
 * draft.maximize(worth);
 * }</pre>
 *
 * @param weights one per item
 * @param profits one per item
 */
public record Knapsack(Views amounts, Longs weights, View capacity, Longs profits, View profit)
    implements Relation {

  public Knapsack {
    Objects.requireNonNull(amounts, "amounts");
    Objects.requireNonNull(weights, "weights");
    Objects.requireNonNull(capacity, "capacity");
    Objects.requireNonNull(profits, "profits");
    Objects.requireNonNull(profit, "profit");
    if (amounts.size() != weights.size() || amounts.size() != profits.size()) {
      throw new IllegalArgumentException(
          amounts.size()
              + " items with "
              + weights.size()
              + " weights and "
              + profits.size()
              + " profits");
    }
  }

  @Override
  public <R> R accept(RelationVisitor<R> visitor) {
    return visitor.knapsack(this);
  }

  @Override
  public Knapsack rewrite(Rewriting rewriting) {
    Views mapped = amounts.mapped(rewriting);
    IntBinaryOperator byContent =
        (i, j) -> {
          int order = mapped.compareRows(i, j);
          order = order != 0 ? order : Long.compare(weights.get(i), weights.get(j));
          return order != 0 ? order : Long.compare(profits.get(i), profits.get(j));
        };
    int[] order = rewriting.rows(mapped.size(), byContent);
    return new Knapsack(
        mapped.permuted(order),
        weights.permuted(order),
        capacity.mapped(rewriting),
        profits.permuted(order),
        profit.mapped(rewriting));
  }

  @Override
  public String kind() {
    return "knapsack";
  }
}
