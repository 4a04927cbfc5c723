package steelyard.adapters.sat.encoding;

import steelyard.variants.model.Table;
import steelyard.variants.model.Tuples;

/**
 * Forbidden rows are a clause each. An allowed row has a literal, which implies the row's values;
 * each value needs a row that has it, which makes unit propagation domain consistent: Bacchus
 * (2007), "GAC via Unit Propagation", CP, LNCS 4741:133-147. Values that only short rows allow are
 * supported by intervals, which is weaker.
 */
final class TableEncoder {
  static final String ALLOWED = "literal per row, support per value (Bacchus 2007)";
  static final String FORBIDDEN = "clause per row (Walsh 2000)";

  private final Cnf cnf;
  private final Integers integers;

  TableEncoder(Cnf cnf, Integers integers) {
    this.cnf = cnf;
    this.integers = integers;
  }

  /** Writes the relation; the encoding's name. */
  String encode(Table relation) {
    if (relation.polarity() == Table.Polarity.FORBIDDEN) {
      for (int row = 0; row < relation.rows().size(); row++) {
        cnf.orAny(cells(relation, row).negated()).end();
      }
      return FORBIDDEN;
    }
    allow(relation);
    return ALLOWED;
  }

  private void allow(Table table) {
    Tuples rows = table.rows();
    int[] chosen = new int[rows.size()];
    for (int row = 0; row < chosen.length; row++) {
      chosen[row] = chosen(cells(table, row));
      cnf.or(chosen[row]);
    }
    cnf.end();
    for (int column = 0; column < rows.arity(); column++) {
      Supports supports = new Supports();
      for (int row = 0; row < chosen.length; row++) {
        int cell = rows.get(row, column);
        if (chosen[row] != Cnf.FALSE && cell == Tuples.ANY) {
          supports.addEverywhere(chosen[row]);
        } else if (chosen[row] != Cnf.FALSE) {
          supports.add(cell, chosen[row]);
        }
      }
      supports.encode(cnf, integers, table.scope().get(column));
    }
  }

  /** The literals that say the row is taken; constants are among them. */
  private Literals cells(Table table, int row) {
    Tuples rows = table.rows();
    Literals cells = new Literals(rows.arity());
    for (int column = 0; column < rows.arity(); column++) {
      if (rows.get(row, column) != Tuples.ANY) {
        cells.add(integers.is(table.scope().get(column), rows.get(row, column)));
      }
    }
    return cells;
  }

  /** A literal that implies every one of {@code cells}; itself where there is but one. */
  private int chosen(Literals cells) {
    Literals open = new Literals(cells.size());
    for (int i = 0; i < cells.size(); i++) {
      if (cells.get(i) == Cnf.FALSE) {
        return Cnf.FALSE;
      }
      if (cells.get(i) != Cnf.TRUE) {
        open.add(cells.get(i));
      }
    }
    if (open.size() <= 1) {
      return open.isEmpty() ? Cnf.TRUE : open.get(0);
    }
    int chosen = cnf.variable();
    for (int i = 0; i < open.size(); i++) {
      cnf.clause(-chosen, open.get(i));
    }
    return chosen;
  }
}
