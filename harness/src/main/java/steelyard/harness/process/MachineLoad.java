package steelyard.harness.process;

import java.util.Optional;
import java.util.stream.LongStream;
import java.util.stream.Stream;

/**
 * What the machine was doing at one moment, to be compared with another. Counters run from boot.
 *
 * <p>Source: proc_loadavg(5), proc_stat(5), proc_vmstat(5), Linux man-pages 6.9. What the system
 * does not say is zero.
 *
 * @param load average number of runnable tasks over the last minute
 * @param stolenTicks time that a virtual machine's host gave to others
 * @param allTicks time of all processors, idle included
 * @param swappedPages pages swapped in and out
 */
public record MachineLoad(double load, long stolenTicks, long allTicks, long swappedPages) {
  /** user, nice, system, idle, iowait, irq, softirq, steal; guest time is within user. */
  private static final int TIMES = 8;

  private static final int STEAL = 7;

  /** As it is now. */
  public static MachineLoad now() {
    return read(ProcFs.SYSTEM);
  }

  static MachineLoad read(ProcFs proc) {
    String average = proc.text("loadavg").orElse("0 ");
    long[] times = processorTimes(proc.text("stat"));
    String paging = proc.text("vmstat").orElse("");
    return new MachineLoad(
        Double.parseDouble(average.substring(0, average.indexOf(' '))),
        times.length > STEAL ? times[STEAL] : 0,
        LongStream.of(times).sum(),
        counter(paging, "pswpin ") + counter(paging, "pswpout "));
  }

  private static long[] processorTimes(Optional<String> stat) {
    String all = stat.flatMap(text -> text.lines().findFirst()).orElse("cpu");
    return Stream.of(all.substring("cpu".length()).strip().split(" +", -1))
        .filter(field -> !field.isEmpty())
        .limit(TIMES)
        .mapToLong(Long::parseLong)
        .toArray();
  }

  private static long counter(String paging, String key) {
    return paging
        .lines()
        .filter(line -> line.startsWith(key))
        .mapToLong(line -> Long.parseLong(line.substring(key.length()).strip()))
        .sum();
  }

  /**
   * The share of processor time since an earlier moment that the host gave to others, in [0, 1].
   */
  public double stolenSince(MachineLoad earlier) {
    long all = allTicks - earlier.allTicks;
    return all <= 0 ? 0 : (double) (stolenTicks - earlier.stolenTicks) / all;
  }

  public long swappedPagesSince(MachineLoad earlier) {
    return swappedPages - earlier.swappedPages;
  }
}
