package steelyard.adapters.engine.search;

import java.util.Arrays;
import java.util.Optional;
import steelyard.adapters.engine.core.Atom;
import steelyard.adapters.engine.core.Network;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;

/**
 * The branching for models that say nothing: fewest values per weighted degree, but the variable of
 * the last conflict first (Lecoutre, Sais, Tabary and Vidal 2009, Reasoning from last conflict(s)
 * in constraint programming, Artificial Intelligence 173:1592-1614).
 *
 * <p>Values: towards the last solution, once there is one; before that, towards what is suggested,
 * what the objective likes, or the least. Wide domains are cut in half, or at the value sought,
 * rather than tried value by value.
 */
public final class Automatic implements Brancher {
  /** Domains of more values than this are cut rather than enumerated. */
  private static final int WIDE = 64;

  /** No value is sought; it is its own negative, and beyond any domain. */
  private static final int NOTHING = Integer.MIN_VALUE;

  private final OpenRows rows;
  private final boolean[] mirrored;
  private final boolean guided;
  private final int[] sought;
  private int conflicting = Store.ZERO;

  /**
   * Decides the rows of {@code scope} until all are fixed.
   *
   * @param objective what shall be small; its presence also turns on guidance by the last solution
   * @param seed shuffles ties between variables; 0 leaves them to the earlier one
   */
  public Automatic(Network network, Scope scope, Optional<Objective> objective, long seed) {
    rows = new OpenRows(network, scope, VariableOrder.WEIGHTED_DEGREE, seed);
    mirrored = new boolean[network.store().variables()];
    sought = new int[mirrored.length];
    Arrays.fill(sought, NOTHING);
    guided = objective.isPresent();
    objective.ifPresent(this::prefer);
  }

  /** As above, over all variables. */
  public Automatic(Network network, Optional<Objective> objective, long seed) {
    this(network, everything(network.store()), objective, seed);
  }

  private static Scope everything(Store s) {
    int[] handles = new int[s.variables() - 1];
    for (int i = 0; i < handles.length; i++) {
      handles[i] = 2 * (i + 1);
    }
    return Scope.of(handles);
  }

  private void prefer(Objective objective) {
    for (int i = 0; i < objective.sum().size(); i++) {
      int h = objective.sum().handle(i);
      mirrored[h >> 1] = (h & 1) != 0;
    }
  }

  /** Goes towards {@code value} for the variable of handle {@code h}, until there is a solution. */
  public Automatic suggesting(int h, int value) {
    sought[h >> 1] = (h & 1) == 0 ? value : -value;
    return this;
  }

  @Override
  public long next(Store s) {
    int h = s.fixed(conflicting) ? rows.pick(s) : conflicting;
    if (h < 0) {
      return NONE;
    }
    int v = h >> 1;
    return decide(s, 2 * v + (mirrored[v] ? 1 : 0));
  }

  private long decide(Store s, int h) {
    int value = mirrored[h >> 1] ? -sought[h >> 1] : sought[h >> 1];
    if (s.has(h, value)) {
      return towards(s, h, value);
    }
    return s.size(h) <= WIDE ? Atom.le(h, s.min(h)) : ValueOrder.LOWER_HALF.decide(s, h);
  }

  private static long towards(Store s, int h, int value) {
    if (value == s.max(h)) {
      return Atom.ge(h, value);
    }
    return value == s.min(h) || s.size(h) > WIDE ? Atom.le(h, value) : Atom.eq(h, value);
  }

  @Override
  public void failed(long atom) {
    conflicting = Atom.handle(atom);
  }

  @Override
  public void solved(Store s) {
    if (guided) {
      for (int v = 0; v < sought.length; v++) {
        sought[v] = s.min(2 * v);
      }
    }
  }
}
