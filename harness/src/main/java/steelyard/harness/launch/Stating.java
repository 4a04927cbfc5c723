package steelyard.harness.launch;

import java.io.IOException;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import steelyard.harness.worker.Event;
import steelyard.harness.worker.Wire;
import steelyard.results.ledger.Recipe;

/** Asks a worker what a model states. */
public final class Stating {
  private static final long MEMORY_BYTES = 4L << 30;
  private static final double HEAP_SHARE = 0.7;

  private final Crew crew;
  private final Duration within;

  /**
   * Asks through this crew.
   *
   * @param within what reading the instance and building the model may take
   */
  public Stating(Crew crew, Duration within) {
    this.crew = crew;
    this.within = within;
  }

  /**
   * The statements of the model that a recipe builds, in the order in which they were made.
   *
   * @throws HarnessProblem if it builds none
   */
  public List<Event.Stated> of(Recipe recipe) {
    return Errands.once(crew, folder -> task(folder, recipe))
        .orThrow("building " + recipe.variant())
        .all(Event.Stated.class)
        .toList();
  }

  private WorkerTask task(Path folder, Recipe recipe) {
    Path file = folder.resolve("subjects.json");
    try {
      Wire.writeSubjects(List.of(Subjects.of(recipe)), file);
    } catch (IOException e) {
      throw HarnessProblem.of("cannot write " + file, e);
    }
    return new WorkerTask(
        "state",
        List.of("state", file.toString()),
        folder,
        crew.installation().withoutBackends(recipe.alias()),
        "",
        HEAP_SHARE,
        1,
        List.of(),
        Crew.service(within, MEMORY_BYTES));
  }
}
