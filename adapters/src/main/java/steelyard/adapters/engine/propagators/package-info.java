/**
 * The constraints of the engine: one propagator per relation, and {@link
 * steelyard.adapters.engine.propagators.Relations}, which posts each relation in its best native
 * form.
 *
 * <p>Every propagator states its relation, consistency level, cost and published source. Two levels
 * recur. Bounds(Z): each bound of each domain is part of a solution in which every variable takes
 * an integer between its bounds. Domain: each value of each domain is part of a solution within the
 * domains.
 */
package steelyard.adapters.engine.propagators;
