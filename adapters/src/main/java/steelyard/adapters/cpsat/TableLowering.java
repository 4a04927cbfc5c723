package steelyard.adapters.cpsat;

import com.google.ortools.sat.TableConstraintProto;
import java.util.Optional;
import java.util.stream.IntStream;
import steelyard.variants.model.Table;
import steelyard.variants.model.Tuples;
import steelyard.variants.model.View;

/** A table as the library's, which knows no short rows: they are written out where few. */
final class TableLowering {
  /** Rows to write short rows out to, at most. */
  private static final long FEW = 10_000;

  private final Places places;
  private final Table table;
  private final TableConstraintProto.Builder made = TableConstraintProto.newBuilder();

  private TableLowering(Places places, Table table) {
    this.places = places;
    this.table = table;
  }

  /**
   * The library's table; empty if there would be too many rows.
   *
   * @param table with a column and a row at least
   */
  static Optional<TableConstraintProto.Builder> of(Table table, Places places) {
    return new TableLowering(places, table).lower();
  }

  private Optional<TableConstraintProto.Builder> lower() {
    int rows = table.rows().size();
    if (IntStream.range(0, rows).mapToLong(this::extra).sum() > FEW) {
      return Optional.empty();
    }
    made.addAllExprs(places.expressions(table.scope()));
    made.setNegated(table.polarity() == Table.Polarity.FORBIDDEN);
    IntStream.range(0, rows).forEach(this::writeOut);
    return Optional.of(made);
  }

  /** Rows that a short row stands for, or more than {@link #FEW}; 0 for a full row. */
  private long extra(int row) {
    if (!table.rows().isShort(row)) {
      return 0;
    }
    long product = 1;
    for (int c = 0; c < table.scope().size() && product <= FEW; c++) {
      View view = table.scope().get(c);
      if (table.rows().get(row, c) == Tuples.ANY && !view.isConstant()) {
        product *= Math.min(places.domain(view.variable()).size(), FEW + 1);
      }
    }
    return product;
  }

  private void writeOut(int row) {
    int arity = table.scope().size();
    int[][] choices =
        IntStream.range(0, arity).mapToObj(c -> choices(row, c)).toArray(int[][]::new);
    int[] at = new int[arity];
    int changed;
    do {
      for (int c = 0; c < arity; c++) {
        made.addValues(choices[c][at[c]]);
      }
      changed = arity - 1;
      while (changed >= 0 && ++at[changed] == choices[changed].length) {
        at[changed--] = 0;
      }
    } while (changed >= 0);
  }

  private int[] choices(int row, int column) {
    int entry = table.rows().get(row, column);
    if (entry != Tuples.ANY) {
      return new int[] {entry};
    }
    View view = table.scope().get(column);
    return view.isConstant()
        ? new int[] {view.offset()}
        : places.domain(view.variable()).stream().map(view::apply).toArray();
  }
}
