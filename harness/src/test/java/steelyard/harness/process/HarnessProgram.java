package steelyard.harness.process;

import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.List;
import java.util.OptionalInt;
import java.util.Set;
import java.util.TreeMap;
import java.util.concurrent.CompletableFuture;

/**
 * A small harness for tests that end it: two children, one that ends with its lifeline and one that
 * is deaf, watched until the end.
 *
 * <p>Arguments: folder of the live table, working folder, tag of the listener, tag of the deaf
 * child, grace in seconds. Exit status: that of the signal received, else 0.
 */
final class HarnessProgram {
  private HarnessProgram() {}

  public static void main(String[] args) throws Exception {
    Path folder = Path.of(args[1]);
    StopSwitch stop = new StopSwitch();
    ProcessLimits limits = limits(Duration.ofSeconds(Long.parseLong(args[4])));
    Launcher launcher = Launcher.noting(new LiveTable(Path.of(args[0])), Tools.detect());
    OptionalInt status;
    try (StopSignals signals = StopSignals.install(stop, launcher)) {
      RunningProcess listener =
          launcher.start(Launch.of("listener", args[2], List.of("cat"), folder));
      RunningProcess deaf =
          launcher.start(Launch.of("deaf", args[3], List.of("sleep", "1000"), folder));
      var first =
          CompletableFuture.supplyAsync(
              new Watch(listener, limits, PhaseSource.none(), stop)::await);
      Files.createFile(folder.resolve("ready"));
      Exit second = new Watch(deaf, limits, PhaseSource.none(), stop).await();
      Files.writeString(folder.resolve("result"), summary(first.join()) + " " + summary(second));
      status = signals.exitStatus();
    }
    System.exit(status.orElse(0));
  }

  private static String summary(Exit exit) {
    String reason = exit.reason().map(Exit.Reason::name).orElse("none");
    return reason + (exit.usage().disturbed() ? " disturbed" : " undisturbed");
  }

  private static ProcessLimits limits(Duration grace) {
    Duration wall = Duration.ofSeconds(100);
    return new ProcessLimits(
        wall, Set.of(ProcessLimits.START), grace, new TreeMap<>(), wall, 1L << 30, 1L << 20);
  }
}
