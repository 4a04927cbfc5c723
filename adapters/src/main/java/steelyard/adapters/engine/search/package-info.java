/**
 * The search over a network of the engine: branching, depth-first search with restarts, enumeration
 * and branch and bound.
 *
 * <p>A {@link steelyard.adapters.engine.search.Search} is made over a {@link
 * steelyard.adapters.engine.core.Network} and a {@link steelyard.adapters.engine.search.Brancher},
 * and run once. All counters are the same on every machine and in every run with the same seed and
 * limits of work.
 */
package steelyard.adapters.engine.search;
