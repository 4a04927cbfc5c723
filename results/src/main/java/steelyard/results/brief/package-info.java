/**
 * The facts of the morning's report: what the runs say, in the order in which an engineer asks.
 *
 * <p>{@link steelyard.results.brief.Brief} turns observations into {@link
 * steelyard.results.brief.Facts}, a tree of records that every page is made from. Nothing here
 * knows a page, a file or a clock.
 */
package steelyard.results.brief;
