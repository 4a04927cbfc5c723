package steelyard.results.ledger;

import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.jdbi.v3.core.Handle;

/** The few statements that adding to the ledger is made of. */
final class Rows {

  private final Handle handle;

  Rows(Handle handle) {
    this.handle = handle;
  }

  /** Runs one statement. */
  void run(String statement, Object... values) {
    handle.execute(statement, values);
  }

  /** Runs one INSERT and returns the new row's id. */
  long add(String insert, Object... values) {
    run(insert, values);
    return handle.select("SELECT last_insert_rowid()").mapTo(Long.class).one();
  }

  /** The first column of the only row, if there is one. */
  Optional<Long> find(String query, Object... values) {
    return handle.select(query, values).mapTo(Long.class).findOne();
  }

  /**
   * The id of the row with these values, which is added if it is not there.
   *
   * @param columnsAndValues column names and values in turn; together they are unique
   */
  long id(String table, Object... columnsAndValues) {
    String[] columns = new String[columnsAndValues.length / 2];
    Object[] values = new Object[columns.length];
    for (int i = 0; i < columns.length; i++) {
      columns[i] = (String) columnsAndValues[2 * i];
      values[i] = columnsAndValues[2 * i + 1];
    }
    String equal = String.join(" = ? AND ", columns) + " = ?";
    return find("SELECT id FROM " + table + " WHERE " + equal, values)
        .orElseGet(() -> add(insert(table, columns), values));
  }

  private static String insert(String table, String... columns) {
    String marks =
        IntStream.range(0, columns.length).mapToObj(i -> "?").collect(Collectors.joining(", "));
    return "INSERT INTO %s (%s) VALUES (%s)".formatted(table, String.join(", ", columns), marks);
  }
}
