package steelyard.adapters.engine.core;

/**
 * Removes values that cannot take part in a solution of one constraint.
 *
 * <p>A propagator is sound (it never removes a solution) and complete at full assignment (with its
 * whole scope fixed, {@link #propagate} returns false exactly where the constraint is violated).
 * Nothing is thrown or allocated while it runs; conflict is a returned {@code false}. State that
 * depends on the branch lives in cells of the store ({@link Wiring#cell}); anything else kept
 * between runs must be valid at any node, such as a watched position.
 */
public interface Propagator {
  /** Cost class of one run: constant time, such as a comparison of two variables. */
  int CONSTANT = 0;

  /** Cost class of one run: linear in the scope. */
  int LINEAR = 1;

  /** Cost class of one run: n log n, or a few passes over bit sets. */
  int LOGLINEAR = 2;

  /** Cost class of one run: quadratic, or a flow or matching. */
  int QUADRATIC = 3;

  /** Number of cost classes. */
  int CLASSES = 4;

  /** The cost class of one run; cheaper propagators run first. */
  int cost();

  /** Subscribes to the events that must wake it and asks for cells; called once, when posted. */
  void attach(Wiring wiring);

  /** Tightens the domains; false where they hold no solution. Woken by its own changes too. */
  boolean propagate(Store s);

  /**
   * Adds to {@code out} atoms that were true before {@code time} and with this constraint alone
   * force {@code atom}; prefers weak ones. {@code atom} is {@link Atom#FALSE} where {@link
   * #propagate} found the conflict by itself.
   *
   * <p>Asked long after the run: only {@link Store#minAt}, {@link Store#maxAt}, {@link
   * Store#excludedAt} and the note behind {@code why} tell what was known then.
   *
   * <p>The default says that no explanation is known by calling {@link Reason#unexplained}, and the
   * analysis then falls back to everything that was known of the scope at that time.
   *
   * @param why the token that the propagator gave with the change
   */
  default void explain(Store s, int time, long atom, int why, Reason out) {
    out.unexplained();
  }
}
