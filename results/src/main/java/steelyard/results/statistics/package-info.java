/**
 * Published statistics as pure functions: no names, no files, no clock.
 *
 * <p>The instance is the unit of every count and mean: runs of one instance (its seeds) are
 * summarised first, then instances count once each. Treating seeds as independent observations
 * would be pseudo-replication (Hurlbert 1984, Ecological Monographs 54:187-211, from memory).
 *
 * <p>Logarithms and powers use {@link java.lang.StrictMath}, so that a report made again on another
 * machine says the same.
 */
package steelyard.results.statistics;
