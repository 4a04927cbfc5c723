package steelyard.adapters.engine.search;

/**
 * What a search has done so far; the same on every machine.
 *
 * @param nodes decisions made, right branches not counted
 * @param failures conflicts
 * @param propagations see {@link steelyard.adapters.engine.core.Network}
 * @param restarts returns to the root
 * @param solutions solutions found
 * @param depth greatest number of decisions in force
 */
public record Counters(
    long nodes, long failures, long propagations, long restarts, long solutions, int depth) {}
