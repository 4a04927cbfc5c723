/** How a model reaches a solver: one package per backend, and what they share in spi. */
package steelyard.adapters;
