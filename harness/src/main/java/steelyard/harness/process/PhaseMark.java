package steelyard.harness.process;

/**
 * A child's statement that it entered a phase.
 *
 * @param phase the phase that begins
 * @param nanos when, by {@link System#nanoTime}, which on Linux is one clock for all processes
 */
public record PhaseMark(String phase, long nanos) {}
