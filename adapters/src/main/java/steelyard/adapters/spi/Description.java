package steelyard.adapters.spi;

import java.util.List;
import java.util.Objects;
import java.util.Set;

/**
 * What a backend says of itself without loading its solver.
 *
 * @param name the adapter's name, such as {@code sat}
 * @param version of the solver library; of the program for built-in search
 * @param followsBranching whether a model's branching and hint change its search
 * @param portable whether equal requests give equal counters on every machine and JDK
 * @param goals what it can be asked for
 * @param workUnits units of work that it can be limited by, the default first
 * @param settings every option, in the order in which help shows them
 * @param heapShare share of the memory limit to give to the Java heap, in (0, 1]
 */
public record Description(
    String name,
    String version,
    boolean followsBranching,
    boolean portable,
    Set<Class<? extends Goal>> goals,
    List<String> workUnits,
    List<Setting> settings,
    double heapShare) {

  public Description {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(version, "version");
    goals = Set.copyOf(goals);
    workUnits = List.copyOf(workUnits);
    settings = List.copyOf(settings);
    if (!(heapShare > 0 && heapShare <= 1)) {
      throw new IllegalArgumentException("heap share must be in (0, 1], was " + heapShare);
    }
  }
}
