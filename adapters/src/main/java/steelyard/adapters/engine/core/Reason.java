package steelyard.adapters.engine.core;

import java.util.Arrays;

/** The atoms that together force another one; reused between explanations. */
public final class Reason {
  private long[] atoms = new long[16];
  private int size;
  private boolean known = true;

  /** Empties it for the next explanation. */
  public void clear() {
    size = 0;
    known = true;
  }

  /** Adds an atom that was true at the time in question; true constants are dropped. */
  public void add(long atom) {
    if (atom == Atom.TRUE) {
      return;
    }
    if (size == atoms.length) {
      atoms = Arrays.copyOf(atoms, 2 * size);
    }
    atoms[size++] = atom;
  }

  /** Says that the propagator cannot tell; the whole scope must be taken. */
  public void unexplained() {
    known = false;
  }

  /** Whether the atoms are the explanation; false if the propagator could not tell. */
  public boolean known() {
    return known;
  }

  /** Number of atoms. */
  public int size() {
    return size;
  }

  /** The atom at a position from 0. */
  public long get(int i) {
    return atoms[i];
  }
}
