package steelyard.variants.model;

import java.util.Arrays;
import java.util.Collection;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** An immutable row of {@link Atom}s, flat in memory, with value equality. */
public final class Atoms {
  private static final Atoms EMPTY = new Atoms(new int[0]);
  private static final int WIDTH = 3;

  /** Three ints a row: variable, comparison, value. */
  private final int[] flat;

  private Atoms(int[] flat) {
    this.flat = flat;
  }

  public static Atoms of(Atom... atoms) {
    return of(Arrays.asList(atoms));
  }

  public static Atoms of(Collection<Atom> atoms) {
    if (atoms.isEmpty()) {
      return EMPTY;
    }
    int[] flat = new int[atoms.size() * WIDTH];
    int at = 0;
    for (Atom atom : atoms) {
      flat[at++] = atom.variable();
      flat[at++] = atom.op().code();
      flat[at++] = atom.value();
    }
    return new Atoms(flat);
  }

  public int size() {
    return flat.length / WIDTH;
  }

  public int variable(int i) {
    return flat[i * WIDTH];
  }

  public Atom.Op op(int i) {
    return Atom.Op.of(flat[i * WIDTH + 1]);
  }

  public int value(int i) {
    return flat[i * WIDTH + 2];
  }

  public Atom get(int i) {
    return new Atom(variable(i), op(i), value(i));
  }

  public Stream<Atom> stream() {
    return IntStream.range(0, size()).mapToObj(this::get);
  }

  Atoms mapped(Rewriting rewriting) {
    int[] mapped = flat.clone();
    for (int i = 0; i < mapped.length; i += WIDTH) {
      if (mapped[i] != Atom.NONE) {
        mapped[i] = rewriting.variable(mapped[i]);
      }
    }
    return new Atoms(mapped);
  }

  /** The rows of this at the positions in {@code order}, in that order. */
  public Atoms permuted(int[] order) {
    int[] moved = new int[order.length * WIDTH];
    for (int i = 0; i < order.length; i++) {
      System.arraycopy(flat, order[i] * WIDTH, moved, i * WIDTH, WIDTH);
    }
    return new Atoms(moved);
  }

  int compareRows(int i, int j) {
    return Arrays.compare(flat, i * WIDTH, (i + 1) * WIDTH, flat, j * WIDTH, (j + 1) * WIDTH);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Atoms that && Arrays.equals(flat, that.flat);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(flat);
  }

  @Override
  public String toString() {
    return stream().toList().toString();
  }
}
