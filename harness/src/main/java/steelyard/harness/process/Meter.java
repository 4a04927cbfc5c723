package steelyard.harness.process;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalLong;
import steelyard.harness.process.ProcFs.Memory;

/**
 * Adds up what the processes of a child use, from one look to the next.
 *
 * <p>CPU time is the larger of two lower bounds: the last reading of every process ever seen; and,
 * at any one look, what the living have used with the children that they have waited for. The first
 * misses processes that lived between two looks, the second those that nobody in the run waited
 * for. What is used after the last look is missed by both.
 *
 * <p>Memory is the larger of the sum over all processes at one look, where pages shared between
 * them count more than once, and the kernel's own peak of a single process, which no look can miss.
 */
final class Meter {
  private final ProcFs proc;
  private final Map<ProcessId, Long> ownTicks = new HashMap<>();
  private long bestTicks;
  private long highestSum;
  private long highestSingle;
  private long polls;
  private long lastNanos;
  private OptionalLong lastUptime = OptionalLong.empty();
  private long longestGapNanos;

  Meter(ProcFs proc, long startNanos) {
    this.proc = proc;
    this.lastNanos = startNanos;
    this.lastUptime = proc.uptimeTicks();
  }

  /** Takes one look; returns the bytes resident now. */
  long look(List<ProcStat> alive, long nowNanos) {
    polls++;
    noteGap(nowNanos);
    long withReaped = 0;
    long resident = 0;
    for (ProcStat stat : alive) {
      ownTicks.put(stat.id(), stat.cpuTicks());
      withReaped += stat.cpuTicks() + stat.reapedTicks();
      Memory memory = proc.memory(stat.pid());
      resident += memory.residentBytes();
      highestSingle = Math.max(highestSingle, memory.peakBytes());
    }
    long allSeen = ownTicks.values().stream().mapToLong(Long::longValue).sum();
    bestTicks = Math.max(bestTicks, Math.max(allSeen, withReaped));
    highestSum = Math.max(highestSum, resident);
    return resident;
  }

  /** The monotonic clock stands still while the machine sleeps, the uptime does not. */
  private void noteGap(long nowNanos) {
    long gap = nowNanos - lastNanos;
    OptionalLong uptime = proc.uptimeTicks();
    if (uptime.isPresent() && lastUptime.isPresent()) {
      long ticks = uptime.getAsLong() - lastUptime.getAsLong();
      gap = Math.max(gap, ticks * ProcFs.NANOS_PER_TICK);
    }
    longestGapNanos = Math.max(longestGapNanos, gap);
    lastNanos = nowNanos;
    lastUptime = uptime;
  }

  Usage usage() {
    boolean sum = highestSum > highestSingle;
    Usage.MemorySource source =
        highestSum == 0 && highestSingle == 0
            ? Usage.MemorySource.NONE
            : sum ? Usage.MemorySource.SUM_AT_A_LOOK : Usage.MemorySource.PEAK_OF_ONE;
    return new Usage(
        bestTicks * ProcFs.NANOS_PER_TICK,
        Math.max(highestSum, highestSingle),
        source,
        polls,
        longestGapNanos);
  }
}
