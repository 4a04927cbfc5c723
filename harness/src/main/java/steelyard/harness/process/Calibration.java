package steelyard.harness.process;

import java.io.IOException;
import java.util.List;

/** Measures how fast the machine is just now, by a fixed task. */
public interface Calibration {
  /** Runs the task once on these logical processors. */
  Sample measure(List<Integer> processors) throws IOException;

  /**
   * One measurement.
   *
   * @param taskNanos what the fixed task took
   * @param before the machine just before
   * @param after the machine just after
   */
  record Sample(long taskNanos, MachineLoad before, MachineLoad after) {}
}
