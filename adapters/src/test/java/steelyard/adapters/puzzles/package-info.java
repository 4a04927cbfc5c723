/** Puzzles whose answers are published: fixtures for whoever answers models. */
package steelyard.adapters.puzzles;
