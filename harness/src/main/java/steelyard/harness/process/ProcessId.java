package steelyard.harness.process;

/**
 * One process since boot. The kernel uses a pid again, but not with the same start time.
 *
 * @param startTicks start time in clock ticks since boot
 */
public record ProcessId(long pid, long startTicks) {}
