package steelyard.results.ledger;

/**
 * The most memory that a run's processes held at once.
 *
 * @param bytes resident; 0 where it was not measured
 * @param source who measured it, such as {@code VmHWM}, {@code cgroup} or {@code none}
 */
public record PeakMemory(long bytes, String source) {
  public PeakMemory {
    Text.requireName("memory source", source);
    if (bytes < 0) {
      throw new IllegalArgumentException("peak memory must be at least 0, was " + bytes);
    }
  }
}
