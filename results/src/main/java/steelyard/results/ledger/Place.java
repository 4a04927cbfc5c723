package steelyard.results.ledger;

/**
 * Where in a plan a run belongs.
 *
 * @param sweep the sweep's id
 * @param sweepName the sweep's name, which later sweeps may share
 * @param block the block's number within the sweep, from 0
 * @param position the place in the block's shuffled order, from 0
 */
public record Place(String sweep, String sweepName, int block, int position) {
  public Place {
    Text.requireId("sweep", sweep);
    Text.requireName("sweepName", sweepName);
    if (block < 0 || position < 0) {
      throw new IllegalArgumentException(
          "block and position must be at least 0, were %d and %d".formatted(block, position));
    }
  }

  /** The cell of the sweep's plan. */
  public CellId cell() {
    return new CellId(block, position);
  }
}
