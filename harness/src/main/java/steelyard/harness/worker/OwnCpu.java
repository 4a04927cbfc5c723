package steelyard.harness.worker;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.OptionalLong;

/** Processor time of this process, all its threads together, as the kernel counts it. */
final class OwnCpu {
  private static final Path STAT = Path.of("/proc/self/stat");

  /** Of the fields after the command's name: utime is the 12th, stime the 13th; proc(5). */
  private static final int UTIME = 11;

  private static final int STIME = 12;

  /** USER_HZ is 100 on every Linux that Java runs on; proc(5). */
  private static final long NANOS_PER_TICK = 10_000_000;

  private OwnCpu() {}

  static OptionalLong nanos() {
    try {
      String stat = Files.readString(STAT, StandardCharsets.ISO_8859_1);
      String[] fields = stat.substring(stat.lastIndexOf(')') + 2).split(" ", STIME + 2);
      long ticks = Long.parseLong(fields[UTIME]) + Long.parseLong(fields[STIME]);
      return OptionalLong.of(ticks * NANOS_PER_TICK);
    } catch (IOException | RuntimeException e) {
      return OptionalLong.empty();
    }
  }
}
