package steelyard.variants.model.build;

import steelyard.variants.model.IntVar;

/**
 * A change to a model being written. What it may do follows from the amendment's role: implied,
 * symmetry and dominance may define and post; search may only branch and hint; a reformulation may
 * also withdraw groups, add decision variables and replace the objective. The first branching phase
 * of a change replaces the branching that was there.
 */
public interface Change extends Draft {
  /** The variable of that name. */
  IntVar variable(String name);

  /**
   * Takes out what the plain model, or a required amendment, posted under {@code group}.
   *
   * @param group {@code GROUP} of plain or {@code AMENDMENT/GROUP}
   */
  void withdraw(String group);
}
