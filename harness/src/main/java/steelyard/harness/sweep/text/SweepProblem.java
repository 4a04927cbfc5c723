package steelyard.harness.sweep.text;

import java.util.List;

/** What a person has to mend in a file before a sweep can be planned, ready to be printed. */
public final class SweepProblem extends RuntimeException {

  private static final long serialVersionUID = 1L;

  private final transient List<String> lines;

  /**
   * A problem in words.
   *
   * @param lines at least one; a line that starts with two spaces belongs to the one before
   */
  public SweepProblem(List<String> lines) {
    super(String.join("\n", lines));
    this.lines = List.copyOf(lines);
  }

  /** What to print, a line each. */
  public List<String> lines() {
    return lines;
  }
}
