package steelyard.harness.worker;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.OptionalLong;

/**
 * Processor time of this process, all its threads together, and of the programs that it has waited
 * for, as the kernel counts it.
 */
final class OwnCpu {
  private static final Path STAT = Path.of("/proc/self/stat");

  /**
   * Of the fields after the command's name: utime, stime, cutime and cstime are the 12th to the
   * 15th; proc(5).
   */
  private static final int FIRST = 11;

  private static final int END = 15;

  /** USER_HZ is 100 on every Linux that Java runs on; proc(5). */
  private static final long NANOS_PER_TICK = 10_000_000;

  private OwnCpu() {}

  static OptionalLong nanos() {
    try {
      String stat = Files.readString(STAT, StandardCharsets.ISO_8859_1);
      String[] fields = stat.substring(stat.lastIndexOf(')') + 2).split(" ", END + 1);
      long ticks = Arrays.stream(fields, FIRST, END).mapToLong(Long::parseLong).sum();
      return OptionalLong.of(ticks * NANOS_PER_TICK);
    } catch (IOException | RuntimeException e) {
      return OptionalLong.empty();
    }
  }
}
