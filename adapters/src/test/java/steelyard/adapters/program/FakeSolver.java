package steelyard.adapters.program;

import java.nio.file.Path;

/** The shell scripts beside the tests that stand for solvers, most of them bad ones. */
final class FakeSolver {
  private static final Path FOLDER =
      Path.of("src/test/resources/steelyard/adapters/program").toAbsolutePath();

  private FakeSolver() {}

  /** The command that runs the script of that name. */
  static String command(String name) {
    return "sh \"" + FOLDER.resolve(name + ".sh") + "\" {cnf}";
  }
}
