package steelyard.harness.process;

import java.util.List;

/** Where the marks of a child's phases come from, such as the tail of its events file. */
public interface PhaseSource {
  /**
   * The marks that came in since the last call, in order. Called at every look, about twenty times
   * a second, by the thread that watches: it must not wait.
   */
  List<PhaseMark> newMarks();

  /** For a child that marks no phases. */
  static PhaseSource none() {
    return List::of;
  }
}
