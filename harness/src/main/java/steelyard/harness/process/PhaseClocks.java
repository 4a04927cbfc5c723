package steelyard.harness.process;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import steelyard.harness.process.ProcessLimits.Clock;

/**
 * Which phase a child is in, and how much each clock has counted.
 *
 * <p>A mark carries the child's own time. It is believed only within what the harness saw: a mark
 * that came in between two looks was made between them, so an earlier or later time is moved to the
 * nearer of the two. A child that lies about time gains nothing beyond one interval between looks.
 */
final class PhaseClocks {
  /** The first marks of a child are kept; one that floods marks is a curiosity, not evidence. */
  private static final int MARKS_KEPT = 100;

  private final ProcessLimits limits;
  private final Map<Clock, Long> counted = new HashMap<>();
  private final List<Exit.Mark> marks = new ArrayList<>();
  private final long startNanos;
  private String phase = ProcessLimits.START;
  private long since;

  PhaseClocks(ProcessLimits limits, long startNanos) {
    this.limits = limits;
    this.startNanos = startNanos;
    this.since = startNanos;
  }

  /** Takes a mark that came in after the look at {@code earlier} and was seen at {@code now}. */
  void mark(PhaseMark mark, long earlier, long now) {
    if (marks.size() < MARKS_KEPT) {
      marks.add(new Exit.Mark(mark.phase(), mark.nanos() - startNanos, now - startNanos));
    }
    long claimed = mark.nanos() - earlier < 0 ? earlier : mark.nanos();
    long at = claimed - now > 0 ? now : claimed;
    stopAt(at - since < 0 ? since : at);
    phase = mark.phase();
  }

  /** Books the time up to {@code nanos} on the clock of the present phase. */
  void stopAt(long nanos) {
    counted.merge(clock(), nanos - since, Long::sum);
    since = nanos;
  }

  String phase() {
    return phase;
  }

  Clock clock() {
    return limits.clock(phase);
  }

  List<Exit.Mark> marks() {
    return List.copyOf(marks);
  }

  /** Nanoseconds until the running clock has counted what it may; negative once it is past. */
  long nanosLeft(long now) {
    Clock clock = clock();
    return clock.allowed().toNanos() - counted.getOrDefault(clock, 0L) - (now - since);
  }

  /** What the main clock has counted, up to the last mark or stop. */
  long mainNanos() {
    return counted.entrySet().stream()
        .filter(entry -> entry.getKey().main())
        .mapToLong(Map.Entry::getValue)
        .sum();
  }
}
