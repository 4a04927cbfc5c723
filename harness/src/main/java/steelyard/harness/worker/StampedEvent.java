package steelyard.harness.worker;

/**
 * An event as it stands in the file.
 *
 * @param number from 0, without gaps
 * @param nanos {@link System#nanoTime}, which on Linux is one clock for all processes
 */
public record StampedEvent(long number, long nanos, Event event) {}
