/**
 * The kernel of the built-in propagator search: domains on a trail, the network of constraints and
 * its fixpoint.
 *
 * <p>Everything is a lower bound. Variable {@code v} has two handles: {@code 2v} stands for x and
 * {@code 2v + 1} for -x, so an upper bound of x is a lower bound of the other handle and one
 * mutator serves both. Conditions, clauses, decisions and explanations share one literal, the
 * {@link steelyard.adapters.engine.core.Atom}. The kernel sees ints only; it knows no model.
 *
 * <p>Life of a network: variables and constraints are posted at the root; the first {@link
 * steelyard.adapters.engine.core.Network#propagate()} freezes it; from then on only levels, atoms
 * and clauses at the root are added.
 */
package steelyard.adapters.engine.core;
