package steelyard.harness.launch;

import java.nio.file.Path;
import steelyard.harness.worker.Subject;
import steelyard.results.ledger.Recipe;

/** Recipes as workers are told them. */
public final class Subjects {
  private Subjects() {}

  public static Subject of(Recipe recipe) {
    return new Subject.OfVariant(
        recipe.family(),
        recipe.instance().name(),
        Path.of(recipe.instance().path()),
        recipe.amendments());
  }
}
