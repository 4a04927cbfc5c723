package steelyard.results.ledger;

import java.nio.file.Path;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.locks.ReentrantLock;
import org.jdbi.v3.core.Handle;
import org.jdbi.v3.core.Jdbi;
import org.jdbi.v3.core.JdbiException;

/**
 * One connection, used by one thread at a time; failures come out as {@link LedgerProblem}.
 *
 * <p>What is added goes through Jdbi in a transaction. What is read, often in bulk or first thing
 * in a command, mostly goes through a plain cursor, which needs neither its mappers nor its start.
 */
final class Store implements AutoCloseable {

  /** Work on the open database. */
  interface Work<T> {
    T with(Handle handle);
  }

  /** Takes the rows of a query one by one. */
  interface RowTaker {
    void take(ResultSet row) throws SQLException;
  }

  /** Makes one thing of one row. */
  interface RowReader<T> {
    T read(ResultSet row) throws SQLException;
  }

  private final Path file;
  private final Connection connection;
  private Optional<Handle> handle = Optional.empty();
  private final ReentrantLock turn = new ReentrantLock();

  Store(Path file, Connection connection) {
    this.file = file;
    this.connection = connection;
  }

  Path file() {
    return file;
  }

  <T> T read(Work<T> work) {
    return inTurn(() -> work.with(handle()));
  }

  /** All of the work or none of it; durable when this returns. */
  <T> T write(Work<T> work) {
    return inTurn(() -> handle().inTransaction(work::with));
  }

  private Handle handle() {
    if (handle.isEmpty()) {
      handle = Optional.of(Jdbi.create(connection).open());
    }
    return handle.get();
  }

  /** What a query gives, one thing for each row. */
  <T> List<T> list(String query, RowReader<T> reader, Object... arguments) {
    List<T> things = new ArrayList<>();
    scan(query, row -> things.add(reader.read(row)), arguments);
    return things;
  }

  /** Takes the rows of a query through a plain cursor. */
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
      handle.ifPresent(Handle::close);
    } catch (SQLException | JdbiException e) {
      throw Problems.of(file, e);
    } finally {
      turn.unlock();
    }
  }
}
