package steelyard.harness.launch;

import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import steelyard.harness.process.ClassPath;
import steelyard.harness.process.ProcessLimits;

/**
 * What a worker is started for.
 *
 * @param name for people, such as a run's id
 * @param arguments the verb and what goes with it
 * @param folder where it works, its own
 * @param classPath what it loads
 * @param backend the backend whose native libraries it needs; empty text for none
 * @param heapShare share of the memory limit for the Java heap
 * @param threads how many processors it is given
 * @param cores logical processors to run on; empty: wherever the kernel likes
 * @param limits what it may use
 */
public record WorkerTask(
    String name,
    List<String> arguments,
    Path folder,
    ClassPath classPath,
    String backend,
    double heapShare,
    int threads,
    List<Integer> cores,
    ProcessLimits limits) {
  public WorkerTask {
    Objects.requireNonNull(name, "name");
    arguments = List.copyOf(arguments);
    Objects.requireNonNull(folder, "folder");
    Objects.requireNonNull(classPath, "classPath");
    Objects.requireNonNull(backend, "backend");
    cores = List.copyOf(cores);
    Objects.requireNonNull(limits, "limits");
  }
}
