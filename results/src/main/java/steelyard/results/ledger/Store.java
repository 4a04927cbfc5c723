package steelyard.results.ledger;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.concurrent.locks.ReentrantLock;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.Jdbi;
import org.jdbi.v3.core.JdbiException;

/** One connection, used by one thread at a time; failures come out as {@link LedgerProblem}. */
final class Store implements AutoCloseable {

  /** Work on the open database. */
  interface Work<T> {
    T with(Handle handle);
  }

  /** Takes the rows of a query one by one. */
  interface RowTaker {
    void take(ResultSet row) throws SQLException;
  }

  private final Path file;
  private final Connection connection;
  private final Handle handle;
  private final ReentrantLock turn = new ReentrantLock();

  Store(Path file, Connection connection) {
    this.file = file;
    this.connection = connection;
    this.handle = Jdbi.create(connection).open();
  }

  Path file() {
    return file;
  }

  <T> T read(Work<T> work) {
    return inTurn(() -> work.with(handle));
  }

  /** All of the work or none of it; durable when this returns. */
  <T> T write(Work<T> work) {
    return inTurn(() -> handle.inTransaction(work::with));
  }

  /** Reads many rows through a plain cursor, without a mapper in between. */
  void scan(String query, RowTaker taker, Object... arguments) {
    inTurn(
        () -> {
          try (PreparedStatement statement = connection.prepareStatement(query)) {
            for (int i = 0; i < arguments.length; i++) {
              statement.setObject(i + 1, arguments[i]);
            }
            try (ResultSet rows = statement.executeQuery()) {
              while (rows.next()) {
                taker.take(rows);
              }
            }
            return null;
          }
        });
  }

  private interface Step<T> {
    T run() throws SQLException;
  }

  private <T> T inTurn(Step<T> step) {
    turn.lock();
    try {
      return step.run();
    } catch (SQLException | JdbiException e) {
      throw Problems.of(file, e);
    } finally {
      turn.unlock();
    }
  }

  @Override
  public void close() {
    turn.lock();
    try (connection) {
      handle.close();
    } catch (SQLException | JdbiException e) {
      throw Problems.of(file, e);
    } finally {
      turn.unlock();
    }
  }
}
