package steelyard.harness.launch;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.function.Function;

/** Workers that are asked one thing in a temporary folder, which goes with them. */
public final class Errands {
  private Errands() {}

  /**
   * Starts a worker in a new folder, waits for it and removes the folder.
   *
   * @param task made for the folder; may write into it
   */
  public static WorkerEnd once(Crew crew, Function<Path, WorkerTask> task) {
    Path folder = make();
    try {
      return crew.perform(task.apply(folder), event -> {});
    } finally {
      remove(folder);
    }
  }

  private static Path make() {
    try {
      return Files.createTempDirectory("steelyard-errand");
    } catch (IOException e) {
      throw HarnessProblem.of("cannot make a temporary folder", e);
    }
  }

  private static void remove(Path folder) {
    try {
      Folders.delete(folder);
    } catch (IOException e) {
      throw HarnessProblem.of("cannot remove " + folder, e);
    }
  }
}
