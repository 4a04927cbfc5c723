package steelyard.harness.process;

import java.util.Optional;

/**
 * What the kernel says of one process in {@code /proc/PID/stat}; times in clock ticks.
 *
 * <p>Source: proc_pid_stat(5), Linux man-pages 6.9. The second field, the program's name, may hold
 * spaces and parentheses, so fields are counted after the last parenthesis.
 *
 * @param state one letter; Z and X are processes that have ended
 * @param cpuTicks user and system time of its own
 * @param reapedTicks user and system time of children that it has waited for
 * @param startTicks start time since boot: with the pid, the identity of a process
 */
record ProcStat(
    long pid,
    char state,
    long parent,
    long group,
    long session,
    long cpuTicks,
    long reapedTicks,
    long startTicks) {

  static Optional<ProcStat> parse(String line) {
    int open = line.indexOf('(');
    int close = line.lastIndexOf(')');
    if (open < 1 || close < open) {
      return Optional.empty();
    }
    String[] fields = line.substring(close + 1).strip().split(" ", -1);
    try {
      return Optional.of(
          new ProcStat(
              Long.parseLong(line.substring(0, open).strip()),
              fields[0].charAt(0),
              Long.parseLong(fields[1]),
              Long.parseLong(fields[2]),
              Long.parseLong(fields[3]),
              Long.parseLong(fields[11]) + Long.parseLong(fields[12]),
              Long.parseLong(fields[13]) + Long.parseLong(fields[14]),
              Long.parseLong(fields[19])));
    } catch (NumberFormatException | IndexOutOfBoundsException e) {
      return Optional.empty();
    }
  }

  /** Whether it still runs: a zombie is gone, though its parent has not looked yet. */
  boolean alive() {
    return state != 'Z' && state != 'X' && state != 'x';
  }

  ProcessId id() {
    return new ProcessId(pid, startTicks);
  }
}
