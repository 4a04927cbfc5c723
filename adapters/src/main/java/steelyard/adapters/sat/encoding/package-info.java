/**
 * From a model to a formula in conjunctive normal form. Sees no solver: clauses go to a {@link
 * steelyard.adapters.sat.encoding.ClauseSink}. Encoding is deterministic, so that the same model
 * gives the same clauses to the sink that counts, the one that prints and the one that solves.
 */
package steelyard.adapters.sat.encoding;
