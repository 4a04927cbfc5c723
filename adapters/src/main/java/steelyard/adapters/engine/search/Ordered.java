package steelyard.adapters.engine.search;

import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * A phase of a branching: a {@link VariableOrder} and a {@link ValueOrder} over the rows of a
 * scope.
 */
public final class Ordered implements Brancher {
  private final OpenRows rows;
  private final ValueOrder values;

  /**
   * Decides the rows of {@code scope} until all are fixed.
   *
   * @param seed shuffles ties between rows; 0 leaves them to the earlier row
   */
  public Ordered(Network network, Scope scope, VariableOrder by, ValueOrder pick, long seed) {
    rows = new OpenRows(network, scope, by, seed);
    values = pick;
  }

  @Override
  public long next(Store s) {
    int h = rows.pick(s);
    return h < 0 ? NONE : values.decide(s, h);
  }
}
