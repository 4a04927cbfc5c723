package steelyard.variants.model;

import java.util.function.IntBinaryOperator;

/**
 * A change of names and of the order of what commutes. One mechanism for four uses: canonical form
 * (rows sorted), seed (rows shuffled), symmetry (variables mapped, rows sorted) and import
 * (variables renumbered). Only a relation knows which of its rows commute, so it asks.
 */
public interface Rewriting {
  /** The id that takes the place of variable {@code old}. */
  int variable(int old);

  /**
   * The order in which {@code size} rows that commute are to stand.
   *
   * @param byContent compares two rows, by position, after their variables were mapped
   * @return a permutation of {@code 0..size-1}: position in the result to position before
   */
  int[] rows(int size, IntBinaryOperator byContent);
}
