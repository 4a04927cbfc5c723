package steelyard.results.ledger;

/**
 * One planned run: a candidate at a position of a block.
 *
 * @param position the place in the block's shuffled order, from 0
 * @param recipe how its model is made
 * @param backend which solver
 * @param setting the backend's options
 * @param key the key that its run will have
 */
public record Cell(int position, Recipe recipe, BackendBuild backend, Setting setting, RunKey key) {
  public Cell {
    if (position < 0) {
      throw new IllegalArgumentException("position must be at least 0, was " + position);
    }
    Text.require("recipe", recipe);
    Text.require("backend", backend);
    Text.require("setting", setting);
    Text.require("key", key);
  }
}
