package steelyard.adapters.spi;

import java.util.Objects;

/**
 * How to solve.
 *
 * @param seed 0 is what the service will run; for the library's own random choices, the model is
 *     permuted already
 * @param threads at least 1
 * @param programs starts solver programs
 */
public record SolveRequest(
    Settings settings, long seed, int threads, Deadline deadline, Programs programs) {
  public SolveRequest {
    Objects.requireNonNull(settings, "settings");
    Objects.requireNonNull(deadline, "deadline");
    Objects.requireNonNull(programs, "programs");
    if (threads < 1) {
      throw new IllegalArgumentException("at least one thread, not " + threads);
    }
  }

  /** A request that starts no program. */
  public SolveRequest(Settings settings, long seed, int threads, Deadline deadline) {
    this(settings, seed, threads, deadline, Programs.NONE);
  }
}
