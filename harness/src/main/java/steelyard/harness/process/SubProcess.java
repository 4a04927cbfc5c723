package steelyard.harness.process;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Optional;
import java.util.concurrent.TimeUnit;
import java.util.function.BooleanSupplier;

/**
 * Runs programs for a process that is itself watched, one at a time, within its session: whoever
 * ends that session ends them too. Each carries a tag of its own, by which it is ended together
 * with all that came of it.
 */
public final class SubProcess {
  private static final long LOOK_EVERY_NANOS = TimeUnit.MILLISECONDS.toNanos(20);

  private final Launcher launcher = Launcher.unnoted(Tools.none());

  private boolean isOver;

  /** Who ended a program. */
  public enum End {
    ITSELF,
    STOPPED,
    WROTE_TOO_MUCH
  }

  /**
   * How a program ended.
   *
   * @param code exit code, or 128 and the signal
   * @param lastWords the end of standard error, printable
   */
  public record Ended(End end, int code, String lastWords) {}

  /** The executable file of that path, or of that name in the search path. */
  public static Optional<Path> find(String program) {
    return Tools.find(program);
  }

  /**
   * Runs a program until it ends, or ends it when told to stop or when it has written too much.
   *
   * @param mostOutputBytes of standard output
   * @throws IOException if it cannot be started
   */
  public Ended run(Launch launch, BooleanSupplier stop, long mostOutputBytes) throws IOException {
    RunningProcess child = start(launch);
    End end = End.STOPPED;
    try {
      end = await(child, stop, mostOutputBytes);
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
    } finally {
      child.end();
    }
    return new Ended(end, code(child), OutputFile.tail(launch.stderr()));
  }

  /** None is started that {@link #endAll} does not know. */
  private synchronized RunningProcess start(Launch launch) throws IOException {
    if (isOver) {
      throw new IOException("cannot start " + launch.command().get(0) + ": all were ended");
    }
    return launcher.start(launch);
  }

  private static End await(RunningProcess child, BooleanSupplier stop, long mostOutputBytes)
      throws IOException, InterruptedException {
    Path output = child.launch().stdout();
    while (!child.awaitFirst(LOOK_EVERY_NANOS)) {
      if (stop.getAsBoolean()) {
        return End.STOPPED;
      }
      if (Files.size(output) > mostOutputBytes) {
        return End.WROTE_TOO_MUCH;
      }
    }
    return Files.size(output) > mostOutputBytes ? End.WROTE_TOO_MUCH : End.ITSELF;
  }

  private static int code(RunningProcess child) {
    return child.code().orElse(-1);
  }

  /** Ends what runs, whoever waits for it; from now on nothing is started. */
  public synchronized void endAll() {
    isOver = true;
    launcher.endAll();
  }
}
