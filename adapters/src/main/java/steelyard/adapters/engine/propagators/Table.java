package steelyard.adapters.engine.propagators;

import java.util.Arrays;
import steelyard.adapters.engine.core.Decidable;
import steelyard.adapters.engine.core.Scope;
import steelyard.adapters.engine.core.Store;
import steelyard.adapters.engine.core.Verdict;
import steelyard.adapters.engine.core.Wiring;

/**
 * The rows' values together are one of the tuples, an entry {@link #ANY} standing for every value.
 *
 * <p>One bit per tuple says whether it is still valid ({@link TupleSet}); each value of each column
 * has the bits of the tuples that support it ({@link TableColumn}). Values that are gone take their
 * tuples with them, and a value whose tuples are all gone goes.
 *
 * <p>Strength: domain; on a column with more than {@value #NARROW} values at the root, values that
 * no tuple has are only cut off at the ends. Cost: the values of the scope times the words that are
 * not yet zero. Not explained yet. Forms: posted and conditional; forbidden tuples are clauses.
 *
 * <p>Source: Demeulenaere, Hartert, Lecoutre, Perez, Perron, Régin and Schaus (2016),
 * Compact-table: efficiently filtering table constraints with reversible sparse bit-sets, CP, LNCS
 * 9892:207-223; short tuples by Verhaeghe, Lecoutre and Schaus (2017), Extending compact-table to
 * negative and short tables, AAAI 3951-3957.
 */
public final class Table implements Decidable {
  /** An entry that stands for every value. */
  static final int ANY = Integer.MAX_VALUE;

  static final int NARROW = 4096;

  private final Scope x;
  private final TupleSet valid;
  private final TableColumn[] columns;
  private final long[] mask;
  private final long[] possible;

  /**
   * The rows of {@code x}, at least one, take one of the tuples.
   *
   * @param tuples one after the other; they {@link #fits fit}
   */
  public Table(Store s, Scope x, int[] tuples) {
    this.x = x;
    int[] within = within(s, x, tuples);
    int count = within.length / x.size();
    valid = new TupleSet(count);
    mask = new long[valid.words()];
    possible = new long[valid.words()];
    columns = new TableColumn[x.size()];
    for (int i = 0; i < columns.length; i++) {
      columns[i] = new TableColumn(s, x, i, within, count, valid.words());
    }
  }

  /** Whether no column with an entry {@link #ANY} has too many values for a list of them. */
  static boolean fits(Store s, Scope x, int[] tuples) {
    for (int t = 0; t < tuples.length; t++) {
      int i = t % x.size();
      if (tuples[t] == ANY && x.max(s, i) - x.min(s, i) >= NARROW) {
        return false;
      }
    }
    return true;
  }

  /** The tuples that the domains allow. */
  private static int[] within(Store s, Scope x, int[] tuples) {
    int n = x.size();
    int[] within = new int[tuples.length];
    int size = 0;
    for (int t = 0; t < tuples.length; t += n) {
      boolean possible = true;
      for (int i = 0; i < n; i++) {
        possible &= tuples[t + i] == ANY || x.has(s, i, tuples[t + i]);
      }
      if (possible) {
        System.arraycopy(tuples, t, within, size, n);
        size += n;
      }
    }
    return Arrays.copyOf(within, size);
  }

  @Override
  public int cost() {
    return LOGLINEAR;
  }

  @Override
  public void attach(Wiring wiring) {
    wiring.onAny(x);
    valid.attach(wiring);
    for (TableColumn column : columns) {
      column.attach(wiring);
    }
  }

  @Override
  public boolean propagate(Store s) {
    for (TableColumn column : columns) {
      TableColumn.Change change = column.update(s, mask);
      if (change != TableColumn.Change.NONE) {
        valid.intersect(s, mask, change == TableColumn.Change.REMAINING);
      }
    }
    if (valid.isEmpty(s)) {
      return s.fail(0);
    }
    for (TableColumn column : columns) {
      if (!column.filter(s, valid)) {
        return false;
      }
    }
    return true;
  }

  @Override
  public Verdict verdict(Store s) {
    valid.fill(possible);
    boolean fixed = true;
    for (int i = 0; i < columns.length; i++) {
      fixed &= x.fixed(s, i);
      columns[i].restrict(s, possible, mask);
    }
    for (long word : possible) {
      if (word != 0) {
        return fixed ? Verdict.TRUE : Verdict.OPEN;
      }
    }
    return Verdict.FALSE;
  }
}
