package steelyard.harness.process;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * How a child ended and what it used.
 *
 * @param code exit code, or 128 + the signal that ended it (a program may also return such a code
 *     by itself); absent only if the kernel still holds the process
 * @param reason why it was asked to stop or killed; absent if it ended by itself
 * @param killed whether it had to be killed; with a reason and not killed, it obeyed
 * @param phase the last phase that it marked
 * @param wallNanos from the start until no process of it was left
 * @param mainNanos what the main clock counted
 * @param overshootNanos how far the main clock went beyond the wall limit, else zero
 * @param usage CPU time, memory and how well they were watched
 * @param strays processes that outlived the first one and were killed
 * @param left processes that could not be ended
 * @param marks the first phase marks, for comparing what the child claimed with what was seen
 * @param stderr the end of standard error, with control characters replaced
 */
public record Exit(
    OptionalInt code,
    Optional<Reason> reason,
    boolean killed,
    String phase,
    long wallNanos,
    long mainNanos,
    long overshootNanos,
    Usage usage,
    int strays,
    int left,
    List<Mark> marks,
    String stderr) {

  private static final int SIGNAL_BASE = 128;
  private static final int HIGHEST_SIGNAL = 64;

  public Exit {
    marks = List.copyOf(marks);
  }

  /** Why the harness ended a child. */
  public enum Reason {
    /** The main clock reached the wall limit. */
    WALL,
    /** Its processes together held more memory than allowed. */
    MEMORY,
    /** A phase outside the main clock took longer than its allowance. */
    PHASE,
    /** Somebody asked the harness to stop. */
    STOPPED
  }

  /**
   * A phase mark, in nanoseconds since the start.
   *
   * @param claimedNanos when the child says that the phase began
   * @param seenNanos when the harness first saw the mark
   */
  public record Mark(String phase, long claimedNanos, long seenNanos) {}

  /** Whether it ended by itself and with code 0. */
  public boolean clean() {
    return code.equals(OptionalInt.of(0)) && reason.isEmpty();
  }

  /** The signal that ended it, by number, if the code is one that stands for a signal. */
  public OptionalInt signal() {
    int signal = code.orElse(0) - SIGNAL_BASE;
    return signal >= 1 && signal <= HIGHEST_SIGNAL ? OptionalInt.of(signal) : OptionalInt.empty();
  }
}
