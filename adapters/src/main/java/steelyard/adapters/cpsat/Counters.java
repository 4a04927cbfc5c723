package steelyard.adapters.cpsat;

import com.google.ortools.sat.CpSolverResponse;
import java.util.LinkedHashMap;
import java.util.Map;
import steelyard.adapters.spi.Monitor;

/** The counters of the calls of one solve, summed. */
final class Counters {
  private static final double MICRO = 1e6;

  private final boolean oneThread;
  private final Map<String, Long> sums = new LinkedHashMap<>();

  /**
   * Of a solve with so many threads: where there are several, the library counts what the first of
   * them did, which says nothing, and only its deterministic clock is told.
   */
  Counters(int threads) {
    this.oneThread = threads == 1;
  }

  void add(CpSolverResponse response) {
    add("deterministic-microseconds", Math.round(response.getDeterministicTime() * MICRO));
    if (oneThread) {
      add("decisions", response.getNumBranches());
      add("failures", response.getNumConflicts());
      add(
          "propagations",
          response.getNumBinaryPropagations() + response.getNumIntegerPropagations());
      add("binary-propagations", response.getNumBinaryPropagations());
      add("integer-propagations", response.getNumIntegerPropagations());
      add("restarts", response.getNumRestarts());
      add("lp-iterations", response.getNumLpIterations());
      add("booleans", response.getNumBooleans());
    }
  }

  private void add(String counter, long amount) {
    sums.merge(counter, amount, Long::sum);
  }

  void tell(Monitor monitor) {
    sums.forEach(monitor::count);
  }
}
