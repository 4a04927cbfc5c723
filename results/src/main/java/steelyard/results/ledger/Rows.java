package steelyard.results.ledger;

import java.nio.ByteBuffer;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.jdbi.v3.core.Handle;

/**
 * The few statements that adding to the ledger is made of. For one transaction: what it has found
 * once it does not look for again.
 */
final class Rows {

  private final Handle handle;
  private final Map<List<Object>, Long> known = new HashMap<>();

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
    return handle.select("SELECT last_insert_rowid()").map((row, context) -> row.getLong(1)).one();
  }

  /** The first column of the only row, if there is one. */
  Optional<Long> find(String query, Object... values) {
    return handle.select(query, values).map((row, context) -> row.getLong(1)).findOne();
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
    return known.computeIfAbsent(identity(table, values), absent -> id(table, columns, values));
  }

  private long id(String table, String[] columns, Object[] values) {
    String equal = String.join(" = ? AND ", columns) + " = ?";
    return find("SELECT id FROM " + table + " WHERE " + equal, values)
        .orElseGet(() -> add(insert(table, columns), values));
  }

  /** Table and values, with bytes compared by content. */
  private static List<Object> identity(String table, Object[] values) {
    List<Object> identity = new ArrayList<>(values.length + 1);
    identity.add(table);
    for (Object value : values) {
      identity.add(value instanceof byte[] bytes ? ByteBuffer.wrap(bytes) : value);
    }
    return identity;
  }

  private static String insert(String table, String... columns) {
    String marks =
        IntStream.range(0, columns.length).mapToObj(i -> "?").collect(Collectors.joining(", "));
    return "INSERT INTO %s (%s) VALUES (%s)".formatted(table, String.join(", ", columns), marks);
  }
}
