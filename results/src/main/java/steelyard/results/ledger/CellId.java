package steelyard.results.ledger;

import java.util.Comparator;

/**
 * One planned run within its sweep.
 *
 * @param block the block's number, from 0
 * @param position the place in the block's shuffled order, from 0
 */
public record CellId(int block, int position) implements Comparable<CellId> {

  private static final Comparator<CellId> PLANNED_ORDER =
      Comparator.comparingInt(CellId::block).thenComparingInt(CellId::position);

  @Override
  public int compareTo(CellId other) {
    return PLANNED_ORDER.compare(this, other);
  }
}
