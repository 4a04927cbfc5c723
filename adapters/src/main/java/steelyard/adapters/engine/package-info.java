/**
 * The built-in propagator search as a backend: a model's relations, goal and branching in its
 * terms.
 */
package steelyard.adapters.engine;
