package steelyard.harness.process;

/**
 * What the processes of a child used, as seen from outside at each look.
 *
 * @param cpuNanos at least this much CPU time, in steps of 10 ms; what was used after the last look
 *     is missing
 * @param peakBytes the most resident memory that was seen
 * @param peakSource what {@code peakBytes} is
 * @param polls number of looks
 * @param longestGapNanos longest time between two looks, sleep of the machine included
 */
public record Usage(
    long cpuNanos, long peakBytes, MemorySource peakSource, long polls, long longestGapNanos) {

  /** Longer between two looks than a busy machine explains: harness or machine were suspended. */
  static final long DISTURBING_GAP_NANOS = 500_000_000;

  /** Where the figure of the peak comes from. */
  public enum MemorySource {
    /** The kernel's peak of the largest process. */
    PEAK_OF_ONE,
    /** The sum over all processes at one look. */
    SUM_AT_A_LOOK,
    /** The child had ended before the first look. */
    NONE
  }

  /** Whether the harness lost sight of the child for so long that its times mean nothing. */
  public boolean disturbed() {
    return longestGapNanos > DISTURBING_GAP_NANOS;
  }
}
