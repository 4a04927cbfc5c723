package steelyard.results.ledger;

import java.util.HashSet;
import java.util.List;
import java.util.Set;

/**
 * Runs that belong together for a fair comparison: candidates on one instance with one seed.
 *
 * @param number its number within the sweep, from 0
 * @param seed the seed
 * @param cells its planned runs; at least one, all of one instance, each at its own position
 */
public record Block(int number, long seed, List<Cell> cells) {
  public Block {
    if (number < 0) {
      throw new IllegalArgumentException("block number must be at least 0, was " + number);
    }
    cells = List.copyOf(Text.require("cells", cells));
    if (cells.isEmpty()) {
      throw new IllegalArgumentException("block %d has no cells".formatted(number));
    }
    Set<Integer> positions = new HashSet<>();
    for (Cell cell : cells) {
      if (!positions.add(cell.position())) {
        throw new IllegalArgumentException(
            "block %d has two cells at position %d".formatted(number, cell.position()));
      }
      if (!cell.recipe().instance().equals(instance(cells))) {
        throw new IllegalArgumentException(
            "block %d has cells of two instances: '%s' and '%s'"
                .formatted(number, instance(cells).name(), cell.recipe().instance().name()));
      }
    }
  }

  private static Recipe.Instance instance(List<Cell> cells) {
    return cells.get(0).recipe().instance();
  }

  /** The instance that all its runs are on. */
  public Recipe.Instance instance() {
    return instance(cells);
  }
}
