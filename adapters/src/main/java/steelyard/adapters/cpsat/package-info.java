/** Lowers to the CP-SAT solver of OR-tools: protobuf messages made directly, bounds kept exact. */
package steelyard.adapters.cpsat;
