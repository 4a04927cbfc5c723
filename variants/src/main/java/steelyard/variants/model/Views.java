package steelyard.variants.model;

import java.util.Arrays;
import java.util.Collection;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** An immutable row of {@link View}s, flat in memory, with value equality. */
public final class Views {
  private static final Views EMPTY = new Views(new int[0]);
  private static final int WIDTH = 3;

  /** Three ints a row: variable, sign, offset. */
  private final int[] flat;

  private Views(int[] flat) {
    this.flat = flat;
  }

  public static Views of(Viewable... views) {
    return of(Arrays.asList(views));
  }

  public static Views of(Collection<? extends Viewable> views) {
    if (views.isEmpty()) {
      return EMPTY;
    }
    int[] flat = new int[views.size() * WIDTH];
    int at = 0;
    for (Viewable each : views) {
      View view = each.view();
      flat[at++] = view.variable();
      flat[at++] = view.sign();
      flat[at++] = view.offset();
    }
    return new Views(flat);
  }

  /** The variables themselves, by id. */
  public static Views ofVariables(int... variables) {
    return of(IntStream.of(variables).mapToObj(View::of).toList());
  }

  /** Constant views of the given values. */
  public static Views ofConstants(int... values) {
    return of(IntStream.of(values).mapToObj(View::constant).toList());
  }

  public int size() {
    return flat.length / WIDTH;
  }

  public int variable(int i) {
    return flat[i * WIDTH];
  }

  public int sign(int i) {
    return flat[i * WIDTH + 1];
  }

  public int offset(int i) {
    return flat[i * WIDTH + 2];
  }

  public boolean isConstant(int i) {
    return sign(i) == 0;
  }

  public View get(int i) {
    return new View(variable(i), sign(i), offset(i));
  }

  public Stream<View> stream() {
    return IntStream.range(0, size()).mapToObj(this::get);
  }

  /** Every view's negative. */
  public Views negated() {
    return of(stream().map(View::negated).toList());
  }

  Views mapped(Rewriting rewriting) {
    int[] mapped = flat.clone();
    for (int i = 0; i < mapped.length; i += WIDTH) {
      if (mapped[i + 1] != 0) {
        mapped[i] = rewriting.variable(mapped[i]);
      }
    }
    return new Views(mapped);
  }

  /** The rows of this at the positions in {@code order}, in that order. */
  public Views permuted(int[] order) {
    int[] moved = new int[order.length * WIDTH];
    for (int i = 0; i < order.length; i++) {
      System.arraycopy(flat, order[i] * WIDTH, moved, i * WIDTH, WIDTH);
    }
    return new Views(moved);
  }

  int compareRows(int i, int j) {
    return Arrays.compare(flat, i * WIDTH, (i + 1) * WIDTH, flat, j * WIDTH, (j + 1) * WIDTH);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Views that && Arrays.equals(flat, that.flat);
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
